/**
 * Milestones outside the protocol that a team may add for one child: a later repair, an extra test, a talk.
 * All windows are common practice and only a proposal; whoever adds one sets the days.
 */
import { daysBetween } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Finding } from './pathway-facts.ts';
import {
  date,
  fitForSurgery,
  grade,
  longText,
  number,
  oneSignature,
  text,
  window,
  yesNo,
} from './default-protocol/fields.ts';
import { milestoneRuleSchema } from './protocol.ts';
import type { MilestoneRule, MilestoneRuleInput } from './protocol.ts';

type Template = Pick<MilestoneRuleInput, 'title' | 'shortTitle' | 'plain' | 'lane' | 'mayClaim' | 'signatures'> &
  Partial<MilestoneRuleInput>;

const operationRecord = [
  date('operation_date', 'Date of the operation'),
  text('technique', 'Technique'),
  longText('events', 'Events during and after'),
  text('consent_id', 'Consent'),
];

const operation = {
  window: window('0d', '6m', '12m'),
  closingDays: 60,
  isOperation: true,
  prerequisites: [fitForSurgery()],
  evidence: operationRecord,
  mayClaim: ['surgeon'],
  signatures: oneSignature('performed', 'surgeon'),
} satisfies Partial<MilestoneRuleInput>;

const visit = { window: window('0d', '6w', '3m'), closingDays: 14 } satisfies Partial<MilestoneRuleInput>;

const templates: readonly Template[] = [
  {
    ...operation,
    title: 'Repair of a further hole in the palate',
    shortTitle: 'Further fistula repair',
    plain: 'A hole in the palate is closed once more.',
    lane: 'surgery',
  },
  {
    ...operation,
    title: 'Lip revision',
    shortTitle: 'Lip revision',
    plain: 'The scar or the shape of the lip is improved.',
    lane: 'surgery',
  },
  {
    ...operation,
    title: 'Nose revision while growing',
    shortTitle: 'Nose revision',
    plain: 'The nose is improved before growth is over.',
    lane: 'surgery',
  },
  {
    ...operation,
    title: 'Second operation on the palate',
    shortTitle: 'Second palate operation',
    plain: 'The palate is operated on again, or the second step of a repair in two steps is done.',
    lane: 'surgery',
  },
  {
    ...operation,
    title: 'Scar revision',
    shortTitle: 'Scar revision',
    plain: 'A scar that is wide or tight is corrected.',
    lane: 'surgery',
  },
  {
    ...visit,
    title: 'Tooth taken out before the graft',
    shortTitle: 'Tooth out before graft',
    plain: 'A tooth in the way of the graft is taken out, at least four weeks before the operation.',
    lane: 'teeth',
    mayClaim: ['dentist'],
    signatures: oneSignature('performed', 'dentist'),
    evidence: [
      text('teeth_removed', 'Teeth taken out'),
      date('extraction_date', 'Taken out on'),
      yesNo('orthodontist_knows', 'Orthodontist and surgeon know'),
    ],
    sources: ['69'],
  },
  {
    ...operation,
    title: 'Second bone graft',
    shortTitle: 'Second bone graft',
    plain: 'Bone is added again where the first graft did not take.',
    lane: 'orthodontics-and-graft',
    mayClaim: ['surgeon', 'jaw-surgeon'],
    signatures: oneSignature('performed', 'surgeon', 'jaw-surgeon'),
  },
  {
    ...visit,
    title: 'Extra hearing test',
    shortTitle: 'Extra hearing test',
    plain: 'Hearing is tested once more, outside the usual rhythm.',
    lane: 'hearing',
    mayClaim: ['audiologist'],
    signatures: oneSignature('performed', 'audiologist'),
    evidence: [longText('result', 'Result'), date('next_test', 'Next test')],
  },
  {
    ...visit,
    title: 'Extra speech review',
    shortTitle: 'Extra speech review',
    plain: 'Speech is listened to once more, outside the usual rhythm.',
    lane: 'speech',
    mayClaim: ['speech-therapist'],
    signatures: oneSignature('performed', 'speech-therapist'),
    evidence: [
      longText('findings', 'Findings'),
      yesNo('vpi_suspected', 'Palate may not close in speech'),
      text('recording_id', 'Recording'),
    ],
    raises: [{ field: 'vpi_suspected', oneOf: ['yes'], finding: 'vpi_suspected' }],
  },
  {
    ...visit,
    title: 'Sleep study',
    shortTitle: 'Sleep study',
    plain: 'Breathing is recorded over a night.',
    lane: 'feeding-and-fitness',
    mayClaim: ['ent', 'paediatrician'],
    signatures: oneSignature('reviewed', 'ent', 'paediatrician'),
    evidence: [
      date('study_date', 'Night of the study'),
      number('obstructive_index', 'Obstructive events', { unit: 'per hour', min: 0, max: 200, likely: [0, 60] }),
      grade('severity', 'Severity'),
      longText('action', 'What is done about it'),
    ],
  },
  {
    ...visit,
    title: 'Family meeting',
    shortTitle: 'Family meeting',
    plain: 'The family and the people it wishes to see sit down together.',
    lane: 'family-and-mind',
    mayClaim: ['coordinator', 'psychologist', 'nurse', 'surgeon'],
    signatures: oneSignature('performed', 'psychologist', 'nurse', 'surgeon'),
    evidence: [text('attended_by', 'Who came'), longText('agreed', 'What was agreed')],
  },
  {
    ...visit,
    title: 'Extra weight and feeding check',
    shortTitle: 'Extra feeding check',
    plain: 'Weight and feeding are looked at once more.',
    lane: 'feeding-and-fitness',
    window: window('0d', '7d', '14d'),
    closingDays: 3,
    mayClaim: ['nurse'],
    signatures: oneSignature('performed', 'nurse'),
    evidence: [longText('findings', 'Findings'), longText('action', 'What is done about it')],
  },
];

/** The finding whose day an added milestone counts from, `added_own_01`. */
const addedFinding = (id: string): string => `added_${id.toLowerCase().replace('-', '_')}`;

const ownId = (number: number): string => `OWN-${String(number).padStart(2, '0')}`;

/** Templates `OWN-01`, `OWN-02` ..., each a whole rule that counts from the day on which it is added. */
export const milestoneCatalogue: readonly MilestoneRule[] = templates.map((template, index) => {
  const id = ownId(index + 1);
  return milestoneRuleSchema.parse({
    id,
    kind: 'conditional',
    clock: { from: 'finding', finding: addedFinding(id) },
    window: window('0d', '3m', '6m'),
    closingDays: 30,
    applies: addedFinding(id),
    appliesText: 'Added by the team for this child.',
    lateMeans: 'Past the day that the team set.',
    ...template,
  });
});

export interface OwnMilestone {
  /** 1 to 999, unused on this child. */
  readonly number: number;
  readonly title: string;
  readonly addedOn: PlainDate;
  readonly earliest: PlainDate;
  readonly target: PlainDate;
  readonly latest: PlainDate;
}

/**
 * A milestone for one child, made from a template, and the finding that starts its clock. The days given become spans in
 * days from the day of adding; closing is shortened to fit them. Throws a RangeError when the days are out of order.
 */
export function ownMilestone(template: MilestoneRule, own: OwnMilestone): { rule: MilestoneRule; finding: Finding } {
  if (own.earliest > own.target || own.target > own.latest) throw new RangeError('The days must be in order.');
  const id = ownId(own.number);
  const name = addedFinding(id);
  const days = (to: PlainDate): string => `${String(daysBetween(own.addedOn, to))}d`;
  const rule = milestoneRuleSchema.parse({
    ...template,
    id,
    title: own.title,
    clock: { from: 'finding', finding: name },
    applies: name,
    window: window(days(own.earliest), days(own.target), days(own.latest)),
    closingDays: Math.min(template.closingDays, daysBetween(own.earliest, own.latest)),
  });
  return { rule, finding: { name, on: own.addedOn } };
}
