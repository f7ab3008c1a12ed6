/**
 * Short ways to write the records and windows of the default protocol.
 * Grades run 0 none, 1 mild, 2 moderate, 3 severe. A field named `..._right` or `..._left` is the patient's own side.
 */
import type { Discipline } from '@weftway/team/disciplines';
import type { EvidenceField, MilestoneRuleInput, Signer } from '../protocol.ts';

type FieldDetails = Partial<Omit<EvidenceField, 'name' | 'label' | 'kind'>>;
type Signature = MilestoneRuleInput['signatures'][number];
type Prerequisite = NonNullable<MilestoneRuleInput['prerequisites']>[number];
type PrerequisiteDetails = Omit<Prerequisite, 'milestone' | 'type'>;

export const text = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'text',
  ...details,
});

export const longText = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'long-text',
  ...details,
});

export const date = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'date',
  ...details,
});

export const yesNo = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'yes-no',
  ...details,
});

export const choice = (
  name: string,
  label: string,
  choices: readonly string[],
  details: FieldDetails = {},
): EvidenceField => ({
  name,
  label,
  kind: 'choice',
  choices: [...choices],
  ...details,
});

/** Bounds are inclusive and in the field's own unit. */
export const number = (
  name: string,
  label: string,
  bounds: {
    unit?: string;
    min: number;
    max: number;
    likely?: [number, number];
  },
  details: FieldDetails = {},
): EvidenceField => ({ name, label, kind: 'number', ...bounds, ...details });

export const grade = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'grade',
  min: 0,
  max: 3,
  ...details,
});

export const rootStage = (name: string, label: string, details: FieldDetails = {}): EvidenceField => ({
  name,
  label,
  kind: 'root-stage',
  ...details,
});

/** The same field once for the patient's right and once for the left. */
export const bothSides = (field: EvidenceField): EvidenceField[] => [
  { ...field, name: `${field.name}_right`, label: `${field.label}, right` },
  { ...field, name: `${field.name}_left`, label: `${field.label}, left` },
];

/** Puts every field under the named signature of a two-signature milestone. */
export const answeredBy = (part: string, fields: readonly EvidenceField[]): EvidenceField[] =>
  fields.map((field) => ({ ...field, part }));

export const weight = (likely: [number, number] = [2000, 12000], name = 'weight_g', label = 'Weight'): EvidenceField =>
  number(name, label, { unit: 'g', min: 300, max: 200000, likely });

export const window = (earliest: string, target: string, latest: string) => ({
  earliest,
  target,
  latest,
});

export const gate = (milestone: string, details: PrerequisiteDetails = {}): Prerequisite => ({
  milestone,
  type: 'gate',
  ...details,
});

export const check = (milestone: string, details: PrerequisiteDetails = {}): Prerequisite => ({
  milestone,
  type: 'check',
  ...details,
});

export const soft = (milestone: string, details: PrerequisiteDetails = {}): Prerequisite => ({
  milestone,
  type: 'soft',
  ...details,
});

/** The check for fitness that stands before every operation: 30 days is common practice. */
export const fitForSurgery = (): Prerequisite =>
  check('CARE-04', {
    freshFor: '30d',
    result: { field: 'fit', oneOf: ['yes'] },
  });

export const signature = (part: string, label: string, meaning: string, by: readonly Signer[]): Signature => ({
  part,
  label,
  meaning,
  disciplines: [...by],
});

/** The signature of a milestone that needs one only. */
export const oneSignature = (meaning: string, ...by: readonly Discipline[]): Signature[] => [
  signature('milestone', 'Sign-off', meaning, by),
];

/** The coordinator for the completeness of the papers, the lead clinician for what they say. */
export const coordinatorAndLead = (): Signature[] => [
  signature('record', 'Record complete', 'recorded', ['coordinator']),
  signature('lead', 'Content agreed', 'reviewed', ['lead-clinician']),
];
