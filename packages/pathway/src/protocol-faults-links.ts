/** Faults between milestones: ids twice or unknown, facts that nobody records, sources not listed, circles. */
import type { Condition } from './condition.ts';
import type { ProtocolFault } from './protocol-faults.ts';
import type { MilestoneRule, Protocol } from './protocol.ts';

/** Facts about a child that are stored or worked out, and so need no milestone to raise them. */
export const childFacts: readonly string[] = [
  'lip',
  'gum',
  'palate',
  'lip_complete',
  'gum_notched',
  'smcp',
  'robin',
  'airway',
  'syndrome',
  'sex_male',
  'molding_team',
  'molding_started',
  'graft_done',
  'speech_surgery_done',
  'tubes',
  'prenatal_referral',
  'operation_is_palate',
  'root_low',
  'root_at_quarter',
];

/** Every fact that a condition of this protocol may name. */
export function knownFacts(protocol: Protocol): ReadonlySet<string> {
  const facts = new Set(childFacts);
  for (const rule of protocol.milestones) {
    facts.add(`signed:${rule.id}`);
    for (const raise of rule.raises) facts.add(raise.finding);
    if (rule.clock.from === 'finding') facts.add(rule.clock.finding);
  }
  return facts;
}

/** Every name of a condition, in order of reading. */
export function namesOf(condition: Condition): string[] {
  if (typeof condition === 'string') return [condition];
  if ('not' in condition) return namesOf(condition.not);
  return ('all' in condition ? condition.all : condition.any).flatMap(namesOf);
}

/** Faults of ids, of references from one milestone to another, and circles that could never open. */
export function linkFaults(protocol: Protocol): ProtocolFault[] {
  const facts = knownFacts(protocol);
  const ids = new Set(protocol.milestones.map((rule) => rule.id));
  return [
    ...protocol.milestones.flatMap((rule, index) => [
      ...duplicateFault(protocol, rule, index),
      ...milestoneReferences(rule, index)
        .filter((reference) => !ids.has(reference.name))
        .map(({ pointer, name }) => ({ pointer, milestone: rule.id, message: `There is no milestone ${name}.` })),
      ...factReferences(rule, index)
        .filter((reference) => !facts.has(reference.name))
        .map(({ pointer, name }) => ({
          pointer,
          milestone: rule.id,
          message: `Nobody records a fact called “${name}”.`,
        })),
      ...sourceFaults(protocol, rule, index),
    ]),
    ...circleFaults(protocol),
  ];
}

interface Reference {
  readonly pointer: string;
  readonly name: string;
}

function duplicateFault(protocol: Protocol, rule: MilestoneRule, index: number): ProtocolFault[] {
  if (protocol.milestones.findIndex((other) => other.id === rule.id) === index) return [];
  const message = `${rule.id} stands in the protocol twice.`;
  return [{ pointer: `/milestones/${String(index)}/id`, milestone: rule.id, message }];
}

function milestoneReferences(rule: MilestoneRule, index: number): Reference[] {
  const at = `/milestones/${String(index)}`;
  const clocks = [
    { clock: rule.clock, pointer: `${at}/clock/milestone` },
    ...rule.repeats.map(({ clock }, order) => ({ clock, pointer: `${at}/repeats/${String(order)}/clock/milestone` })),
  ];
  return [
    ...clocks.flatMap(({ clock, pointer }) =>
      clock && 'milestone' in clock ? [{ pointer, name: clock.milestone }] : [],
    ),
    ...rule.prerequisites.map(({ milestone }, order) => ({
      pointer: `${at}/prerequisites/${String(order)}/milestone`,
      name: milestone,
    })),
    ...rule.moves.map((name, order) => ({ pointer: `${at}/moves/${String(order)}`, name })),
  ];
}

function factReferences(rule: MilestoneRule, index: number): Reference[] {
  const at = `/milestones/${String(index)}`;
  const conditions: { condition: Condition | undefined; pointer: string }[] = [
    { condition: rule.applies, pointer: `${at}/applies` },
    ...rule.variants.map(({ when }, order) => ({ condition: when, pointer: `${at}/variants/${String(order)}/when` })),
    ...rule.prerequisites.map(({ when }, order) => ({
      condition: when,
      pointer: `${at}/prerequisites/${String(order)}/when`,
    })),
    ...rule.repeats.map(({ when }, order) => ({ condition: when, pointer: `${at}/repeats/${String(order)}/when` })),
  ];
  return conditions.flatMap(({ condition, pointer }) =>
    condition === undefined ? [] : namesOf(condition).map((name) => ({ pointer, name })),
  );
}

function sourceFaults(protocol: Protocol, rule: MilestoneRule, index: number): ProtocolFault[] {
  return rule.sources.flatMap((source, order) =>
    source in protocol.sources
      ? []
      : [
          {
            pointer: `/milestones/${String(index)}/sources/${String(order)}`,
            milestone: rule.id,
            message: `Source ${source} is not in the list of sources.`,
          },
        ],
  );
}

/**
 * What a milestone waits for: gates, checks and the event of its clock. A booked date is no wait, since a booking can be
 * made before; soft prerequisites only warn.
 */
function waitsFor(rule: MilestoneRule): string[] {
  const needs = rule.prerequisites.filter((need) => need.type !== 'soft').map((need) => need.milestone);
  return rule.clock.from === 'event' ? [...needs, rule.clock.milestone] : needs;
}

function circleFaults(protocol: Protocol): ProtocolFault[] {
  const waits = new Map(protocol.milestones.map((rule) => [rule.id, waitsFor(rule)]));
  const done = new Set<string>();
  const faults: ProtocolFault[] = [];
  const visit = (id: string, path: readonly string[]): void => {
    const start = path.indexOf(id);
    if (start >= 0) {
      const circle = [...path.slice(start), id];
      const index = protocol.milestones.findIndex((rule) => rule.id === id);
      const message = `These wait for each other and could never open: ${circle.join(' → ')}.`;
      faults.push({ pointer: `/milestones/${String(index)}/prerequisites`, milestone: id, message });
      return;
    }
    if (done.has(id)) return;
    for (const next of waits.get(id) ?? []) visit(next, [...path, id]);
    done.add(id);
  };
  for (const id of waits.keys()) visit(id, []);
  return faults;
}
