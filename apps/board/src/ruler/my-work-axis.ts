/** The axis of My work: weeks from today, three stretches that each run evenly. Positions run from 0 to 1. */
const stretches = [
  { from: -9, to: 0, share: 0.25 },
  { from: 0, to: 6, share: 0.4 },
  { from: 6, to: 28, share: 0.35 },
] as const;

export const firstWeek = -9;
export const lastWeek = 28;
export const todayPosition = 0.25;

/** Weeks that carry a label; months are counted as 4.348 weeks. */
export const myWorkTicks = [
  { week: -4, name: '4-weeks-ago' },
  { week: 2, name: '2-weeks' },
  { week: 4, name: '4-weeks' },
  { week: 6, name: '6-weeks' },
  { week: 13.04, name: '3-months' },
  { week: 26.09, name: '6-months' },
] as const;
export type MyWorkTick = (typeof myWorkTicks)[number]['name'];

/** Where a number of days from today lies; days outside lie on the ends. */
export function myWorkPosition(daysFromToday: number): number {
  const week = Math.min(Math.max(daysFromToday / 7, firstWeek), lastWeek);
  let start = 0;
  for (const { from, to, share } of stretches) {
    if (week <= to) return start + (share * (week - from)) / (to - from);
    start += share;
  }
  return 1;
}
