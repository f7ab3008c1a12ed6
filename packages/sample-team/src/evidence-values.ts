/** Plausible values for the records of a milestone, the same every time for the same child and occurrence. */
import { addDays } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence } from '@weftway/contract/pathway';
import type { EvidenceField, MilestoneRule } from '@weftway/pathway/protocol';
import { chance, oneOf } from './chance.ts';

export interface EvidenceSetting {
  readonly seed: string;
  readonly on: PlainDate;
  /** Whole months since birth. */
  readonly ageMonths: number;
  readonly cleft: string;
  /** Months by which this child's teeth run early (positive) or late. */
  readonly toothShift: number;
  /** Weeks since the molding plate was fitted. */
  readonly moldingWeeks: number;
  readonly isRobin: boolean;
  readonly takesMolding: boolean;
  readonly signerName: string;
}

const rootByMonths: readonly (readonly [number, string])[] = [
  [78, '0'],
  [90, '1/4'],
  [99, '1/3'],
  [108, '1/2'],
  [118, '2/3'],
  [130, '3/4'],
];

/** Stage of the canine root at an age; a made-up course for the demo, not a norm. */
export const rootStageAt = (months: number): string => rootByMonths.find(([until]) => months < until)?.[1] ?? '1';

const gapAfter = (weeks: number, seed: string): number =>
  Math.max(1.2, (8.5 + 4 * chance(`${seed}gap`)) * 0.9 ** weeks);

const likely =
  (yes: number) =>
  (setting: EvidenceSetting, name: string): string =>
    chance(setting.seed + name) < yes ? 'yes' : 'no';

type Chooser = (setting: EvidenceSetting, name: string) => string;

/** Fields whose value steers the path. */
const steering: Readonly<Record<string, Chooser>> = {
  option_chosen: ({ takesMolding }) => (takesMolding ? 'plate with nose stent' : 'lip tape only'),
  safe_for_plate: () => 'yes',
  safe_for_anaesthesia: ({ isRobin }) => (isRobin ? 'with plan' : 'yes'),
  fit: () => 'yes',
  untreated_decay: likely(0.04),
  robin_sequence: ({ isRobin }) => (isRobin ? 'yes' : 'no'),
  submucous: () => 'none',
  airway_adjunct: () => 'none',
  position_needed: () => 'none',
  syndrome_found: () => 'no',
  deletion_22q11: () => 'no',
  stickler_risk: () => 'no',
  gene_result: () => 'excluded',
  symptomatic: likely(0.06),
  result_right: likelyChoice(0.06, 'refer', 'pass'),
  result_left: likelyChoice(0.06, 'refer', 'pass'),
  tubes: likelyChoice(0.3, 'with palate repair', 'none'),
  tubes_done: () => 'no',
  vpi_suspected: likely(0.1),
  decision: likelyChoice(0.5, 'surgery', 'therapy'),
  expansion_needed: likely(0.4),
  started: () => 'yes',
  graft_track: () => 'canine',
  treatment_need: likely(0.85),
  lateral_incisor_right: likelyChoice(0.4, 'missing', 'present'),
  lateral_incisor_left: likelyChoice(0.4, 'missing', 'present'),
  regraft_needed: () => 'no',
  jaw_plan: likelyChoice(0.22, 'wait for surgery', 'none'),
  braces_needed: () => 'yes',
  jaw_mismatch: likely(0.15),
  jaw_surgery_planned: likely(0.1),
  plan: likelyChoice(0.5, 'implant', 'close the space'),
  status: ({ ageMonths, toothShift }) => (ageMonths + toothShift > 138 ? 'in the arch' : 'unerupted'),
  gap_at_or_below_5mm: ({ moldingWeeks, seed }) =>
    gapAfter(moldingWeeks, seed.split('#')[0] ?? seed) <= 5 ? 'yes' : 'no',
  lahshal_code: ({ cleft }) => cleft,
};

function likelyChoice(share: number, rare: string, usual: string): Chooser {
  return (setting, name) => (chance(setting.seed + name) < share ? rare : usual);
}

const phrases: readonly string[] = ['As planned', 'See the letter of that day', 'Discussed with the family'];

/** Words that fit a field by its name; else a plain remark. */
const fittingWords: readonly (readonly [RegExp, readonly string[]])[] = [
  [/technique/, ['The usual one of this team', 'As drawn in the operation note']],
  [/trainee/, ['Assisted', 'Closed the skin', 'None']],
  [/donor/, ['Hip, left side', 'Hip, right side']],
  [/tool/, ["The team's own questions"]],
  [/antibiotic/, ['One dose at induction']],
  [/appliance|retainer|splint/, ['Fixed', 'Removable']],
  [/dentist|worker|coordinator|contact|accepted|rater|by$/, ['Named in the letter of that day']],
  [/language/, ['As in the record']],
  [/bottle/, ['Soft squeeze bottle']],
  [/position/, ['Upright']],
  [/place|room/, ['Molding room, ready for an airway']],
];

const fitting = (name: string): readonly string[] =>
  fittingWords.find(([pattern]) => pattern.test(name))?.[1] ?? phrases;

const numberValue = (field: EvidenceField, setting: EvidenceSetting): string => {
  if (field.name.startsWith('gap_mm') || field.name.startsWith('final_gap'))
    return gapAfter(setting.moldingWeeks, setting.seed.split('#')[0] ?? setting.seed).toFixed(1);
  if (field.name === 'weight_g')
    return String(Math.round(3300 + Math.min(setting.ageMonths, 60) * 230 + 300 * chance(setting.seed)));
  if (field.name.startsWith('age_days')) return String(Math.round(setting.ageMonths * 30.4));
  if (field.name.startsWith('age_months')) return String(setting.ageMonths);
  const [low, high] = field.likely ?? [field.min ?? 0, field.max ?? 10];
  const value = low + (high - low) * (0.3 + 0.4 * chance(setting.seed + field.name));
  return high - low < 3 ? value.toFixed(1) : String(Math.round(value));
};

const hasPlace = (cleft: string, side: 'right' | 'left'): boolean =>
  (side === 'right' ? cleft.slice(0, 3) : cleft.slice(4)) !== '•••';

const textValue = (field: EvidenceField, setting: EvidenceSetting): string => {
  if (field.name.endsWith('_id'))
    return `TE-${setting.on.slice(2, 4)}${setting.on.slice(5, 7)}-${String(Math.floor(chance(setting.seed + field.name) * 9000) + 1000)}`;
  if (field.name === 'surgeon' || field.name === 'read_by') return setting.signerName;
  return oneOf(fitting(field.name), setting.seed + field.name);
};

const plainValue = (field: EvidenceField, setting: EvidenceSetting): string => {
  const steered = steering[field.name]?.(setting, field.name);
  if (steered !== undefined && (field.choices === undefined || field.choices.includes(steered))) return steered;
  switch (field.kind) {
    case 'yes-no':
      return chance(setting.seed + field.name) < 0.6 ? 'yes' : 'no';
    case 'choice':
      return oneOf(field.choices ?? ['none'], setting.seed + field.name);
    case 'grade':
      return String(Math.floor(chance(setting.seed + field.name) * 1.6));
    case 'number':
      return numberValue(field, setting);
    case 'date':
      return field.name.startsWith('next') ? addDays(setting.on, 28) : setting.on;
    case 'root-stage':
      return rootStageAt(setting.ageMonths + setting.toothShift);
    default:
      return textValue(field, setting);
  }
};

const sideOf = (name: string): 'right' | 'left' | null =>
  name.endsWith('_right') ? 'right' : name.endsWith('_left') ? 'left' : null;

const oneSided = /^(root_stage|canine|lateral|gap_mm|final_gap|nostril)/;

/** Values for the fields of one part; a field of a side without a cleft stays empty with its reason. */
export const evidenceFor = (rule: MilestoneRule, part: string, setting: EvidenceSetting): Evidence => {
  const firstPart = rule.signatures[0]?.part ?? '';
  const values: Record<string, Evidence[string]> = {};
  for (const field of rule.evidence) {
    if ((field.part ?? firstPart) !== part) continue;
    const side = sideOf(field.name);
    const isOtherSide = side !== null && oneSided.test(field.name) && !hasPlace(setting.cleft, side);
    values[field.name] = isOtherSide
      ? { value: null, emptyBecause: 'No cleft on this side' }
      : { value: plainValue(field, setting) };
  }
  return values;
};
