/** Lane `outcome-records`: records at fixed ages, the same for every child, on which results are compared. */
import type { EvidenceField, MilestoneRuleInput } from '../protocol.ts';
import { answeredBy, choice, coordinatorAndLead, longText, number, text, window, yesNo } from './fields.ts';

const photos = text('photo_set_id', 'Photographs');
const models = text('models_id', 'Models or scan');
const hearing = text('hearing', 'Hearing');
const speechRecording = text('speech_recording_id', 'Speech recording');
const decay = number('dmft_adult', 'Adult teeth decayed, missing or filled', {
  unit: 'teeth',
  min: 0,
  max: 32,
});
const consentForAudit = yesNo('consent_for_audit', 'Consent to use in comparisons');
const patientReported: EvidenceField = longText('patient_reported', 'What the patient reports', {
  hint: 'Appearance, speech, eating, school, feelings: tool and bands, no question texts.',
});
const operations = (name: string, label: string) =>
  number(name, label, { unit: 'operations', min: 0, max: 60, likely: [0, 15] });

const withheld = 'Consent withheld: kept for care only, left out of comparisons';
const shared = {
  lane: 'outcome-records',
  kind: 'core',
  clock: { from: 'birth' },
  appliesText: 'Every child.',
  mayClaim: ['coordinator'],
  signatures: coordinatorAndLead(),
} satisfies Partial<MilestoneRuleInput>;

export const outcomeRecordMilestones: MilestoneRuleInput[] = [
  {
    ...shared,
    id: 'REC-01',
    title: 'Five-year outcome record',
    shortTitle: 'Record at 5',
    plain: 'At five the results of the first operations are put on record.',
    window: window('5y', '5y3m', '6y'),
    closingDays: 90,
    evidence: [
      ...answeredBy('record', [
        photos,
        models,
        choice('five_year_index', 'Five-year index of the models', ['1', '2', '3', '4', '5', 'not used']),
        number('dmft_milk', 'Milk teeth decayed, missing or filled', {
          unit: 'teeth',
          min: 0,
          max: 20,
        }),
        hearing,
        text('speech_record', 'Five-year speech record'),
        number('height_cm', 'Height', {
          unit: 'cm',
          min: 60,
          max: 160,
          likely: [90, 130],
        }),
        number('weight_kg', 'Weight', {
          unit: 'kg',
          min: 7,
          max: 80,
          likely: [12, 35],
        }),
        choice('psych_band', 'Wellbeing, band', ['low', 'raised', 'high']),
        text('parent_questionnaire', 'Questionnaire of the parents'),
        consentForAudit,
      ]),
      ...answeredBy('lead', [
        yesNo('fistula', 'Hole in the palate'),
        operations('operations_count', 'Operations so far'),
      ]),
    ],
    waivedWhen: [withheld],
    lateMeans: 'Sixth birthday.',
    sources: ['7', '8', '9', '56', '58'],
  },
  {
    ...shared,
    id: 'REC-02',
    title: 'Ten-year outcome record',
    shortTitle: 'Record at 10',
    plain: 'At ten growth, teeth, speech, hearing and the graft are put on record.',
    window: window('9y6m', '10y', '11y'),
    closingDays: 90,
    evidence: [
      ...answeredBy('record', [photos, models, decay, speechRecording, hearing, patientReported, consentForAudit]),
      ...answeredBy('lead', [
        choice('arch_index', 'Arch relationship of the models', ['1', '2', '3', '4', '5', 'not used']),
        text('graft_result', 'Result of the graft'),
      ]),
    ],
    waivedWhen: [withheld],
    lateMeans: 'Eleventh birthday.',
    sources: ['8', '9', '15', '16'],
  },
  {
    ...shared,
    id: 'REC-03',
    title: 'Twelve-year record',
    shortTitle: 'Record at 12',
    plain: 'At twelve jaws, teeth and the young person’s own view are put on record.',
    window: window('11y9m', '12y', '13y'),
    closingDays: 90,
    evidence: [
      ...answeredBy('record', [photos, models, text('panoramic_id', 'Panoramic x-ray'), patientReported]),
      ...answeredBy('lead', [
        text('jaw_relation', 'Relation of the jaws'),
        text('canine_status', 'Eye teeth'),
        yesNo('braces_needed', 'Needs full braces'),
      ]),
    ],
    raises: [{ field: 'braces_needed', oneOf: ['yes'], finding: 'treatment_need' }],
    waivedWhen: [withheld],
    lateMeans: 'Thirteenth birthday.',
    moves: ['ORTH-08'],
    sources: ['10', '15'],
  },
  {
    ...shared,
    id: 'REC-04',
    title: 'Fifteen-year record',
    shortTitle: 'Record at 15',
    plain: 'At fifteen the record shows whether the jaws have grown apart and what is still wished for.',
    window: window('14y9m', '15y', '16y'),
    closingDays: 90,
    evidence: [
      ...answeredBy('record', [
        photos,
        models,
        text('side_view_xray_id', 'Side-view x-ray'),
        speechRecording,
        hearing,
        decay,
        patientReported,
        yesNo('genetics_talk_offered', 'Talk on genetics offered again'),
      ]),
      ...answeredBy('lead', [
        yesNo('jaw_mismatch', 'Upper and lower jaw do not match'),
        yesNo('jaw_surgery_planned', 'Jaw surgery is planned'),
      ]),
    ],
    raises: [
      { field: 'jaw_mismatch', oneOf: ['yes'], finding: 'jaw_mismatch' },
      {
        field: 'jaw_surgery_planned',
        oneOf: ['yes'],
        finding: 'jaw_surgery_planned',
      },
    ],
    waivedWhen: [withheld],
    lateMeans: 'Sixteenth birthday.',
    moves: ['GROW-01'],
    sources: ['8', '9', '10'],
  },
  {
    ...shared,
    id: 'REC-05',
    title: 'Record at the end of care',
    shortTitle: 'End-of-care record',
    plain: 'The last record tells what twenty years of care have come to.',
    window: window('18y', '19y', '22y'),
    closingDays: 180,
    evidence: [
      ...answeredBy('record', [
        photos,
        models,
        text('speech', 'Speech'),
        hearing,
        text('teeth', 'Teeth'),
        patientReported,
        text('satisfaction', 'Satisfaction with care'),
      ]),
      ...answeredBy('lead', [
        operations('operations_total', 'Operations in all'),
        longText('open_problems', 'Problems still open'),
      ]),
    ],
    waivedWhen: ['Young adult declines'],
    lateMeans: 'Twenty-second birthday.',
    moves: ['ADLT-03'],
    sources: ['5', '8', '9', '10'],
  },
];
