/** Faults of windows: earliest, target and latest in order, and the closing part inside the window. */
import { addSpanToDay, readSpan } from '@weftway/calendar/span';
import type { Span } from '@weftway/calendar/span';
import type { ProtocolFault } from './protocol-faults.ts';
import type { MilestoneRule, Protocol } from './protocol.ts';

type WindowRule = MilestoneRule['window'];

/** Every day of one four-year cycle as epoch days: enough to meet every length of month. From 2023-03-01. */
const firstBase = 19417;
const cycle = 1461;

/** Windows that are out of order on some base date, or shorter than their own closing part. */
export function windowFaults(protocol: Protocol): ProtocolFault[] {
  return protocol.milestones.flatMap((rule, index) => {
    const at = `/milestones/${String(index)}`;
    return [
      ...faultsOf(rule, rule.window, `${at}/window`),
      ...rule.variants.flatMap((variant, order) =>
        faultsOf(rule, variant.window, `${at}/variants/${String(order)}/window`),
      ),
      ...rule.repeats.flatMap((repeat, order) =>
        faultsOf(rule, repeat.window, `${at}/repeats/${String(order)}/window`),
      ),
      ...catchUpFaults(rule, at),
    ];
  });
}

function faultsOf(rule: MilestoneRule, window: WindowRule, pointer: string): ProtocolFault[] {
  const earliest = readSpan(window.earliest);
  const target = readSpan(window.target);
  const latest = readSpan(window.latest);
  if (earliest === null || target === null || latest === null) return []; // said by the shape
  const faults: ProtocolFault[] = [];
  const say = (message: string) => faults.push({ pointer, milestone: rule.id, message });
  if (shortest(earliest, target) < 0)
    say(`The target ${window.target} comes before the earliest day ${window.earliest}.`);
  if (shortest(target, latest) < 0) say(`The latest day ${window.latest} comes before the target ${window.target}.`);
  const days = shortest(earliest, latest);
  if (faults.length === 0 && rule.closingDays > days) {
    say(`Closing takes ${String(rule.closingDays)} days, but the window can be as short as ${String(days)} days.`);
  }
  return faults;
}

function catchUpFaults(rule: MilestoneRule, at: string): ProtocolFault[] {
  if (!rule.catchUp) return [];
  const [target, latest] = rule.catchUp;
  if (target >= 0 && latest >= target) return [];
  const message = `Catch-up days must rise from 0: target ${String(target)}, latest ${String(latest)}.`;
  return [{ pointer: `${at}/catchUp`, milestone: rule.id, message }];
}

/** Fewest days from one span to another over all base dates; negative when they can be out of order. */
export function shortest(from: Span, to: Span): number {
  if (from.months === to.months) return to.days - from.days;
  let fewest = Number.POSITIVE_INFINITY;
  for (let base = firstBase; base < firstBase + cycle; base += 1) {
    fewest = Math.min(fewest, addSpanToDay(base, to) - addSpanToDay(base, from));
  }
  return fewest;
}
