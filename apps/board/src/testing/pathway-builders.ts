/** A child with a pathway, for tests of the child's page; only what matters is named. */
import { plainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import type { Pathway, Signature } from '@weftway/contract/pathway';
import type { Me } from '@weftway/contract/session';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import { childPlan, type ChildPlan } from '../features/pathway/model/child-plan.ts';
import {
  childViews,
  viewNamed,
  type ChildViews,
  type MilestoneView,
} from '../features/pathway/model/milestone-view.ts';

export const day = plainDate;
export const builtToday = day('2026-04-20');

export const surgeon: Me = {
  id: 'm-1',
  name: 'Obed Nkansah',
  email: 'obed@tern-estuary.example',
  standing: 'member',
  disciplines: ['surgeon'],
  supervisorId: null,
};
export const orthodontist: Me = { ...surgeon, id: 'm-2', name: 'Ines Calder', disciplines: ['orthodontist'] };
export const speechTherapist: Me = { ...surgeon, id: 'm-3', name: 'Shirin Vaziri', disciplines: ['speech-therapist'] };
export const trainee: Me = { ...surgeon, id: 'm-4', name: 'Pavel Novák', standing: 'trainee' };
const names = new Map([surgeon, orthodontist, speechTherapist, trainee].map((person) => [person.id, person.name]));

/** Born on 15 January 2026 with a left complete cleft of lip, gum and palate. */
export const facts = (over: Partial<PathwayFacts> = {}): PathwayFacts => ({
  birth: day('2026-01-15'),
  due: null,
  isBirthEstimated: false,
  gestation: { weeks: 39, days: 2 },
  sex: 'female',
  cleft: '•••SHAL',
  flags: [],
  teamStart: null,
  transferredOn: null,
  findings: [{ name: 'birth_referral', on: day('2026-01-15') }],
  completions: [],
  parts: [],
  waivers: [],
  holds: [],
  bookings: [],
  roots: [],
  ...over,
});

export const fields = (over: Partial<ChildFields> = {}): ChildFields => ({
  firstName: 'Amara',
  familyName: 'Okoye',
  recordNumber: 'TE-30001',
  bornOn: day('2026-01-15'),
  dueOn: null,
  isBirthEstimated: false,
  gestation: { weeks: 39, days: 2 },
  sex: 'female',
  cleft: '•••SHAL',
  isCleftProvisional: false,
  flags: [],
  syndromes: [],
  referredOn: null,
  prenatalReferralOn: null,
  teamStartOn: null,
  site: 'Tern Quay',
  leadClinicianId: 'm-1',
  contacts: [
    {
      name: 'Chidi Okoye',
      relation: 'father',
      phone: '',
      email: '',
      language: 'Igbo',
      needsInterpreter: true,
      mayConsent: true,
    },
  ],
  alerts: [{ kind: 'latex', text: 'Latex allergy' }],
  notes: '',
  ...over,
});

type PathwayParts = Partial<Omit<Pathway, 'facts' | 'child'>> & {
  readonly facts?: Partial<PathwayFacts>;
  readonly fields?: Partial<ChildFields>;
};

export const pathway = ({ facts: factsOver, fields: fieldsOver, ...over }: PathwayParts = {}): Pathway => ({
  child: {
    id: 'c-1',
    version: 1,
    fields: fields(fieldsOver),
    icd10: null,
    protocolVersion: 1,
    transferredOn: null,
    transferredTo: '',
    traineeIds: [],
    careEnded: null,
    registeredAt: '2026-01-15T09:00:00Z',
  },
  version: 1,
  facts: facts(factsOver),
  protocolVersion: 1,
  ownMilestones: [],
  claims: [],
  drafts: [],
  signatures: [],
  trainees: [],
  history: [],
  ...over,
});

export const signature = (over: Partial<Signature> & Pick<Signature, 'milestone' | 'performedOn'>): Signature => ({
  id: 's-1',
  part: 'milestone',
  occurrence: 1,
  signedAt: `${over.performedOn}T10:41:00Z`,
  signerId: 'm-1',
  signerName: 'Obed Nkansah',
  signerRole: 'Cleft surgeon',
  meaning: 'performed',
  values: {},
  draftedByName: null,
  overrides: [],
  protocolVersion: 1,
  digest: 'd',
  amends: null,
  amendReason: null,
  ...over,
});

export interface BuiltChild {
  readonly of: ChildPlan;
  readonly views: ChildViews;
  readonly view: (key: string) => MilestoneView;
}

export const builtChild = (parts: PathwayParts = {}, today: PlainDate = builtToday): BuiltChild => {
  const of = childPlan(pathway(parts), defaultProtocol, today);
  const views = childViews(of, (id) => names.get(id) ?? '');
  const view = (key: string): MilestoneView => {
    const found = viewNamed(views, key);
    if (found === undefined) throw new Error(`${key} is not on the path`);
    return found;
  };
  return { of, views, view };
};
