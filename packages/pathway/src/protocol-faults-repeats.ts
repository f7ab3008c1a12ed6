/** Faults of rhythms: a recurring milestone must come to an end, and its ages must be in order. */
import { readSpan } from '@weftway/calendar/span';
import type { Condition } from './condition.ts';
import { knownFacts, namesOf } from './protocol-faults-links.ts';
import { shortest } from './protocol-faults-windows.ts';
import type { ProtocolFault } from './protocol-faults.ts';
import type { MilestoneRule, Protocol } from './protocol.ts';

type Repeat = MilestoneRule['repeats'][number];

/** Rhythms without an end, ends that nobody can reach and ages the wrong way round. */
export function repeatFaults(protocol: Protocol): ProtocolFault[] {
  const facts = knownFacts(protocol);
  return protocol.milestones.flatMap((rule, index) =>
    rule.repeats.flatMap((repeat, order) => {
      const pointer = `/milestones/${String(index)}/repeats/${String(order)}`;
      const messages = [
        ...ageMessages(repeat),
        ...untilMessages(protocol, facts, repeat),
        ...endMessages(protocol, rule, repeat),
      ];
      return messages.map((message) => ({ pointer, milestone: rule.id, message }));
    }),
  );
}

function ageMessages(repeat: Repeat): string[] {
  const from = repeat.ageFrom === undefined ? null : readSpan(repeat.ageFrom);
  const to = repeat.ageTo === undefined ? null : readSpan(repeat.ageTo);
  if (from === null || to === null || shortest(from, to) > 0) return [];
  return [`The rhythm ends at ${String(repeat.ageTo)}, not after it begins at ${String(repeat.ageFrom)}.`];
}

function untilMessages(protocol: Protocol, facts: ReadonlySet<string>, repeat: Repeat): string[] {
  return (repeat.until ?? [])
    .filter((name) => !facts.has(name) && !protocol.milestones.some((other) => other.id === name))
    .map((name) => `It runs until “${name}”, which is neither a milestone nor a fact that somebody records.`);
}

function endMessages(protocol: Protocol, rule: MilestoneRule, repeat: Repeat): string[] {
  const isOnce = repeat.byAge === true || repeat.ageTo !== undefined || repeat.clock !== undefined;
  if (isOnce || (repeat.until ?? []).some((name) => isReachableEnd(protocol, rule, repeat, name))) return [];
  return ['It would go on for ever: give it an age, or a milestone that every such child reaches, as its end.'];
}

/** An end counts when each child with this rhythm has it on the path, when the same lane leads to it, or when it is a finding. */
function isReachableEnd(protocol: Protocol, rule: MilestoneRule, repeat: Repeat, name: string): boolean {
  const end = protocol.milestones.find((other) => other.id === name);
  if (!end) return protocol.milestones.some((other) => other.raises.some((raise) => raise.finding === name));
  if (end.applies === undefined || end.lane === rule.lane) return true;
  const here = [rule.applies, repeat.when].filter((condition) => condition !== undefined);
  return follows(here, end.applies);
}

/** Whether the conclusion holds in every case in which all premises hold; tries every case, up to 2^12 of them. */
function follows(premises: readonly Condition[], conclusion: Condition): boolean {
  const names = [...new Set([...premises, conclusion].flatMap(namesOf))];
  if (names.length > 12) return false;
  for (let bits = 0; bits < 2 ** names.length; bits += 1) {
    const facts = new Set(names.filter((_, place) => (bits >> place) & 1));
    if (premises.every((premise) => holds(premise, facts)) && !holds(conclusion, facts)) return false;
  }
  return true;
}

function holds(condition: Condition, facts: ReadonlySet<string>): boolean {
  if (typeof condition === 'string') return facts.has(condition);
  if ('not' in condition) return !holds(condition.not, facts);
  return 'all' in condition
    ? condition.all.every((part) => holds(part, facts))
    : condition.any.some((part) => holds(part, facts));
}
