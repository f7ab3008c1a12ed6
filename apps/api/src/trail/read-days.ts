/** A local day of the team as a half-open range of UTC instants. */

const partsOf = (instant: number, zone: string): number => {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  }).formatToParts(instant);
  const read = (type: Intl.DateTimeFormatPartTypes): number => Number(parts.find((part) => part.type === type)?.value);
  return Date.UTC(read('year'), read('month') - 1, read('day'), read('hour'), read('minute'), read('second'));
};

/** UTC instant at which a local day begins; where the clocks skip midnight, the first instant after it. */
export const dayBegins = (date: string, zone: string): string => {
  const wanted = Date.parse(`${date}T00:00:00.000Z`);
  // The distance to UTC is looked up twice, since the clocks may change between the guess and the answer.
  const guess = wanted - (partsOf(wanted, zone) - wanted);
  return new Date(wanted - (partsOf(guess, zone) - guess)).toISOString();
};

/** Half-open: from the start of the first day to the start of the day after the last. */
export const instantsOf = (
  days: { readonly from?: string | undefined; readonly to?: string | undefined },
  zone: string,
): { readonly from?: string; readonly to?: string } => ({
  ...(days.from === undefined ? {} : { from: dayBegins(days.from, zone) }),
  ...(days.to === undefined
    ? {}
    : { to: dayBegins(new Date(Date.parse(days.to) + 86_400_000).toISOString().slice(0, 10), zone) }),
});
