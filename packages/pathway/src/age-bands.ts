/**
 * Repeats that go by age: a visit counts for the latest band whose opening it has reached, and bands before it close as
 * missed (ruling on bands). Also the one repeat that stands before and after an event.
 */
import { addSpanToDay } from '@weftway/calendar/span';
import { laidOccurrence, type Awaited, type Happening } from './awaited.ts';
import { applyArrival } from './late-arrival.ts';
import { completionsOf, until, type PastOccurrence, type Planning, type Row } from './planning.ts';
import { layAgeWindow, layFirstWindow, type FirstWindow, type WindowSource } from './window.ts';
import { layWindow, newDraft, type WindowDraft } from './window-draft.ts';

/** The band of ages that is awaited. */
export function awaitedBand(
  planning: Planning,
  row: Row,
  happened: readonly Happening[],
  asOf: number,
  source: WindowSource,
): Awaited {
  const bands = row.milestone.repeats;
  const traced = planning.options.reasons !== false;
  const past: PastOccurrence[] = [];
  let covered = -1;
  let lastKind: Happening['kind'] | null = null;
  const windowOf = (band: number, day: number): { draft: WindowDraft; first: FirstWindow } => {
    const draft = newDraft(traced);
    const repeat = bands[band - 1];
    if (repeat === undefined) {
      const question = { asOf: day, arrivedBy: day, rhythm: null, source };
      return { draft, first: layFirstWindow(planning, row, draft, question) };
    }
    layAgeWindow(planning, draft, repeat);
    const offPath = applyArrival(planning, row, draft, { rhythm: null, rowOf: source.rowOfId, asOf: day });
    return { draft, first: { ...laidOccurrence, offPath } };
  };
  let lastDraft = newDraft(false);
  for (const one of happened) {
    const reached =
      one.kind === 'waived' ? covered + 1 : Math.max(bandReached(planning, row, one.on), covered < 0 ? 0 : -1);
    if (reached <= covered || reached > bands.length) continue;
    for (let missed = covered + 1; missed < reached && traced; missed += 1) {
      const { draft } = windowOf(missed, one.on);
      past.push({ occurrence: missed + 1, on: draft.latest, kind: 'missed', draft });
    }
    lastDraft = windowOf(reached, one.on).draft;
    covered = reached;
    lastKind = one.kind;
    past.push({ occurrence: covered + 1, on: one.on, kind: one.kind, draft: lastDraft });
  }
  if (covered >= bands.length) {
    return { first: laidOccurrence, draft: lastDraft, occurrence: covered + 1, isFinished: true, lastKind, past };
  }
  const next = windowOf(covered + 1, asOf);
  return { first: next.first, draft: next.draft, occurrence: covered + 2, isFinished: false, lastKind, past };
}

/** Number of the latest band whose opening lies on or before a day: 0 for the first window, -1 before it. */
function bandReached(planning: Planning, row: Row, day: number): number {
  const { birth } = planning.child;
  let reached = addSpanToDay(birth, row.milestone.window.earliest) <= day ? 0 : -1;
  row.milestone.repeats.forEach((band, at) => {
    if (addSpanToDay(birth, band.window.earliest) <= day) reached = at + 1;
  });
  return reached;
}

/** A first occurrence before an event and a second one counted from it (the check before and after jaw surgery). */
export function awaitedAroundEvent(
  planning: Planning,
  row: Row,
  happened: readonly Happening[],
  asOf: number,
  source: WindowSource,
): Awaited {
  const repeat = row.milestone.repeats.find((one) => one.eventIndex >= 0);
  const draft = newDraft(planning.options.reasons !== false);
  const events = until(completionsOf(planning, repeat?.eventIndex ?? -1, null), asOf);
  const event = events[events.length - 1];
  const after = event === undefined ? happened : happened.filter((one) => one.on > event.on);
  const last = after[after.length - 1];
  const past = happened.map((one, at) => ({ occurrence: at + 1, on: one.on, kind: one.kind, draft: null }));
  const answer = { past, lastKind: last?.kind ?? null, isFinished: last !== undefined, draft };
  if (event === undefined || repeat === undefined) {
    const question = { asOf, arrivedBy: asOf, rhythm: null, source };
    return { ...answer, first: layFirstWindow(planning, row, draft, question), occurrence: 1 };
  }
  const name = repeat.rule.clock && 'milestone' in repeat.rule.clock ? repeat.rule.clock.milestone : '';
  const base = { day: event.on, rule: 'base-event', details: { event: { name, on: event.on } } } as const;
  layWindow(draft, base, repeat, 'repeat-span');
  const offPath =
    last === undefined ? applyArrival(planning, row, draft, { rhythm: null, rowOf: source.rowOfId, asOf }) : null;
  return { ...answer, first: { ...laidOccurrence, offPath }, occurrence: 2 };
}
