/** Faults of records and signatures: names twice, parts that do not exist, values that a field cannot take. */
import type { ProtocolFault } from './protocol-faults.ts';
import type { EvidenceField, MilestoneRule, Protocol } from './protocol.ts';

interface Place {
  readonly rule: MilestoneRule;
  readonly at: string;
}

/** Faults of evidence fields, signature parts, findings raised and results asked for. */
export function evidenceFaultsOf(protocol: Protocol): ProtocolFault[] {
  return protocol.milestones.flatMap((rule, index) => {
    const place = { rule, at: `/milestones/${String(index)}` };
    return [
      ...twice(
        place,
        'evidence',
        rule.evidence.map((field) => field.name),
        'The field',
      ),
      ...twice(
        place,
        'signatures',
        rule.signatures.map((part) => part.part),
        'The signature',
      ),
      ...rule.evidence.flatMap((field, order) => fieldFaults(place, field, order)),
      ...raiseFaults(place),
      ...demandFaults(protocol, place),
      ...twice(place, 'waivedWhen', rule.waivedWhen, 'The reason'),
    ];
  });
}

const fault = ({ rule, at }: Place, path: string, message: string): ProtocolFault => ({
  pointer: `${at}/${path}`,
  milestone: rule.id,
  message,
});

function twice(place: Place, list: string, names: readonly string[], what: string): ProtocolFault[] {
  return names.flatMap((name, order) =>
    names.indexOf(name) === order
      ? []
      : [fault(place, `${list}/${String(order)}`, `${what} “${name}” stands there twice.`)],
  );
}

function fieldFaults(place: Place, field: EvidenceField, order: number): ProtocolFault[] {
  const path = `evidence/${String(order)}`;
  const faults: ProtocolFault[] = [];
  const { min, max, likely, part } = field;
  if (part !== undefined && !place.rule.signatures.some((signature) => signature.part === part)) {
    faults.push(fault(place, `${path}/part`, `“${field.name}” belongs to “${part}”, but no signature has that name.`));
  }
  if (field.kind === 'choice' && (field.choices ?? []).length === 0) {
    faults.push(fault(place, `${path}/choices`, `“${field.name}” is a choice without anything to choose.`));
  }
  if (min !== undefined && max !== undefined && min > max) {
    faults.push(fault(place, `${path}/min`, `The least value of “${field.name}” lies above its largest.`));
  }
  if (likely && (likely[0] > likely[1] || likely[0] < (min ?? likely[0]) || likely[1] > (max ?? likely[1]))) {
    faults.push(
      fault(place, `${path}/likely`, `The likely range of “${field.name}” does not lie inside its possible one.`),
    );
  }
  return [...faults, ...valueFaults(place, `${path}/secondNameFor`, field, field.secondNameFor ?? [])];
}

function raiseFaults(place: Place): ProtocolFault[] {
  return place.rule.raises.flatMap((raise, order) => {
    const path = `raises/${String(order)}`;
    const field = place.rule.evidence.find((candidate) => candidate.name === raise.field);
    return field
      ? valueFaults(place, `${path}/oneOf`, field, raise.oneOf)
      : [
          fault(
            place,
            `${path}/field`,
            `The finding “${raise.finding}” reads a field “${raise.field}” that is not there.`,
          ),
        ];
  });
}

function demandFaults(protocol: Protocol, place: Place): ProtocolFault[] {
  return place.rule.prerequisites.flatMap(({ milestone, result }, order) => {
    const asked = protocol.milestones.find((candidate) => candidate.id === milestone);
    if (!result || !asked) return []; // an unknown milestone is said elsewhere
    const path = `prerequisites/${String(order)}/result`;
    const field = asked.evidence.find((candidate) => candidate.name === result.field);
    return field
      ? valueFaults(place, `${path}/oneOf`, field, result.oneOf)
      : [fault(place, `${path}/field`, `${milestone} has no field “${result.field}” that could be asked for.`)];
  });
}

function valueFaults(place: Place, path: string, field: EvidenceField, values: readonly string[]): ProtocolFault[] {
  const possible = field.kind === 'yes-no' ? ['yes', 'no'] : field.kind === 'choice' ? (field.choices ?? []) : null;
  if (possible === null) return [];
  return values
    .filter((value) => !possible.includes(value))
    .map((value) =>
      fault(place, path, `“${field.name}” can never be “${value}”; it is one of: ${possible.join(', ')}.`),
    );
}
