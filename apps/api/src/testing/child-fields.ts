/** Fields of a child for tests: only what matters is named. */
import type { ChildFields } from '@weftway/contract/child';

const date = (text: string) => text as NonNullable<ChildFields['bornOn']>; // literals of tests

type Dated = 'bornOn' | 'dueOn' | 'referredOn' | 'prenatalReferralOn' | 'teamStartOn';
type Overrides = Partial<Omit<ChildFields, Dated> & Record<Dated, string | null>>;

export const childFields = (overrides: Overrides = {}): ChildFields =>
  ({
    firstName: 'Amara',
    familyName: 'Okonjo',
    recordNumber: 'TE-0001',
    bornOn: date('2026-10-06'),
    dueOn: null,
    isBirthEstimated: false,
    gestation: { weeks: 39, days: 2 },
    sex: 'female',
    cleft: '•••SHAL',
    isCleftProvisional: true,
    flags: [],
    syndromes: [],
    referredOn: date('2026-10-07'),
    prenatalReferralOn: null,
    teamStartOn: date('2026-10-08'),
    site: 'Tern Quay',
    leadClinicianId: null,
    contacts: [],
    alerts: [],
    notes: '',
    ...overrides,
  }) as ChildFields; // dates of tests are literals
