/** The invented children: who they are, what cleft they have, and which turn their story takes. */
import { addDays, addMonths } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import { chance, oneOf } from './chance.ts';
import { nameSets } from './names.ts';

export const sampleSites = ['Tern Quay', 'Saltmarsh', 'Heron Point'] as const;

/** A turn of the story that makes a state or a rule visible. */
export type Turn =
  | 'plain'
  | 'expected'
  | 'early-birth'
  | 'robin'
  | 'syndrome'
  | 'late-arrival'
  | 'unverified'
  | 'lost'
  | 'quiet'
  | 'slow-lip'
  | 'squeezed'
  | 'lapsed'
  | 'transferred'
  | 'estimated-birth'
  | 'held'
  | 'half-signed'
  | 'drafted'
  | 'waived'
  | 'own-milestone';

export interface SampleStory {
  readonly id: string;
  readonly turn: Turn;
  readonly fields: ChildFields;
  readonly toothShift: number;
  readonly takesMolding: boolean;
}

const cleftsByShare: readonly (readonly [number, string])[] = [
  [0.18, '•••SHAL'],
  [0.1, 'LAHS•••'],
  [0.05, '•••SHal'],
  [0.03, 'laHS•••'],
  [0.11, 'LAHSHAL'],
  [0.02, 'l*HSH*L'],
  [0.14, '••HSH••'],
  [0.09, '••hSh••'],
  [0.07, '•••S•••'],
  [0.03, '•••s•••'],
  [0.07, '••••••L'],
  [0.04, 'L••••••'],
  [0.03, '•••••al'],
  [0.03, 'LA•••••'],
  [0.01, '*••••••'],
];

const cleftFor = (seed: string): string => {
  let left = chance(`${seed}cleft`);
  for (const [share, code] of cleftsByShare) {
    left -= share;
    if (left < 0) return code;
  }
  return '•••SHAL';
};

/** Ages of the caseload in days, youngest first: more babies, since their weeks are the busiest. */
const agesInDays = (): readonly number[] => {
  const ages: number[] = [];
  const spread = (count: number, from: number, to: number): void => {
    for (let index = 0; index < count; index += 1) ages.push(Math.round(from + ((to - from) * (index + 0.5)) / count));
  };
  spread(22, 2, 180);
  spread(18, 180, 548);
  spread(28, 548, 1826);
  spread(34, 1826, 3287);
  spread(30, 3287, 4748);
  spread(18, 4748, 6209);
  spread(8, 6209, 7400);
  return ages;
};

const turnsBySlot: readonly (readonly [number, Turn])[] = [
  [7, 'early-birth'],
  [11, 'robin'],
  [16, 'lapsed'],
  [19, 'early-birth'],
  [24, 'robin'],
  [27, 'slow-lip'],
  [29, 'squeezed'],
  [30, 'squeezed'],
  [31, 'syndrome'],
  [36, 'slow-lip'],
  [41, 'late-arrival'],
  [44, 'unverified'],
  [47, 'held'],
  [52, 'drafted'],
  [55, 'lost'],
  [58, 'drafted'],
  [61, 'waived'],
  [64, 'quiet'],
  [67, 'drafted'],
  [70, 'estimated-birth'],
  [74, 'held'],
  [78, 'syndrome'],
  [81, 'transferred'],
  [84, 'own-milestone'],
  [88, 'lost'],
  [91, 'held'],
  [95, 'unverified'],
  [99, 'half-signed'],
  [103, 'waived'],
  [107, 'held'],
  [111, 'quiet'],
  [115, 'half-signed'],
  [119, 'transferred'],
  [123, 'half-signed'],
  [127, 'held'],
  [131, 'held'],
  [135, 'waived'],
  [139, 'half-signed'],
  [143, 'own-milestone'],
  [147, 'half-signed'],
  [151, 'waived'],
  [155, 'transferred'],
];

const leads: readonly string[] = [
  'm-obed-nkansah',
  'm-mireille-aubert',
  'm-ines-calder',
  'm-shirin-vaziri',
  'm-wen-zhao',
  'm-hana-dvorak',
];

const alertsFor = (seed: string, needsInterpreter: boolean, language: string): ChildFields['alerts'] => [
  ...(chance(`${seed}latex`) < 0.05 ? [{ kind: 'latex' as const, text: 'Latex allergy' }] : []),
  ...(chance(`${seed}allergy`) < 0.08
    ? [
        {
          kind: 'allergy' as const,
          text: oneOf(['Penicillin: rash', 'Adhesive tape: blisters', 'Egg: vomiting'], seed),
        },
      ]
    : []),
  ...(needsInterpreter ? [{ kind: 'interpreter' as const, text: `Interpreter, ${language}` }] : []),
];

/** Mothers' and fathers' first names stand in turn in the list. */
const carerOf = (adults: readonly string[], familyName: string, seed: string) => {
  const isMother = chance(`${seed}who`) < 0.7;
  const names = adults.filter((_name, index) => (index % 2 === 0) === isMother);
  return { name: `${oneOf(names, `${seed}adult`)} ${familyName}`, relation: isMother ? 'mother' : 'father' } as const;
};

const basicFields = (index: number, seed: string): ChildFields => {
  const set = chance(`${seed}tongue`) < 0.45 ? nameSets[0] : oneOf(nameSets, `${seed}set`);
  if (set === undefined) throw new Error('No names');
  const sex = chance(`${seed}sex`) < 0.46 ? 'female' : 'male';
  const needsInterpreter =
    set.language !== 'English' && set.language !== 'Welsh' && chance(`${seed}interpreter`) < 0.45;
  const familyName = oneOf(set.families, `${seed}family`);
  return {
    firstName: oneOf(sex === 'female' ? set.girls : set.boys, `${seed}first`),
    familyName,
    recordNumber: `TE-${String(10_240 + index * 37)}`,
    bornOn: null,
    dueOn: null,
    isBirthEstimated: false,
    gestation: { weeks: 38 + Math.floor(chance(`${seed}weeks`) * 3), days: Math.floor(chance(`${seed}days`) * 7) },
    sex,
    cleft: cleftFor(seed),
    isCleftProvisional: false,
    flags: [],
    syndromes: [],
    referredOn: null,
    prenatalReferralOn: null,
    teamStartOn: null,
    site: oneOf(sampleSites, `${seed}site`),
    leadClinicianId: oneOf(leads, `${seed}lead`),
    contacts: [
      {
        ...carerOf(set.adults, familyName, seed),
        phone: `01632 960${String(100 + index).slice(-3)}`,
        email: `family${index}@example.org`,
        language: set.language,
        needsInterpreter,
        mayConsent: true,
      },
    ],
    alerts: alertsFor(seed, needsInterpreter, set.language),
    notes: '',
  };
};

const turned = (fields: ChildFields, turn: Turn, bornOn: PlainDate, today: PlainDate, seed: string): ChildFields => {
  const born = { ...fields, bornOn, referredOn: addDays(bornOn, chance(`${seed}referral`) < 0.8 ? 0 : 1) };
  switch (turn) {
    case 'early-birth':
      return { ...born, gestation: { weeks: 31 + Math.floor(chance(`${seed}early`) * 4), days: 3 } };
    case 'robin':
      return {
        ...born,
        cleft: '••hSh••',
        flags: ['robin', 'airway'],
        alerts: [...born.alerts, { kind: 'airway', text: 'Robin sequence: airway plan before any anaesthetic' }],
      };
    case 'syndrome':
      return {
        ...born,
        cleft: '•••S•••',
        flags: ['syndrome'],
        syndromes: ['22q11.2 deletion'],
        alerts: [
          ...born.alerts,
          { kind: 'other', text: 'Heart and calcium checked before anaesthesia; neck vessels before throat surgery' },
        ],
      };
    case 'late-arrival':
    case 'unverified': {
      const teamStartOn = addDays(today, turn === 'unverified' ? -45 : -70);
      return {
        ...born,
        teamStartOn,
        referredOn: teamStartOn,
        gestation: null,
        cleft: 'LAHSHAL',
        isBirthEstimated: turn === 'unverified',
      };
    }
    case 'estimated-birth':
      return { ...born, isBirthEstimated: true, gestation: null };
    case 'slow-lip':
    case 'squeezed':
      return { ...born, cleft: '•••SHAL' };
    case 'lapsed':
      return { ...born, cleft: 'LAHS•••' };
    default:
      return born;
  }
};

const expectedStories = (today: PlainDate): SampleStory[] =>
  [20, 46, 71, 98].map((days, index) => {
    const seed = `expected${index}`;
    const fields = basicFields(900 + index, seed);
    return {
      id: `c-expected-${index + 1}`,
      turn: 'expected',
      toothShift: 0,
      takesMolding: true,
      fields: {
        ...fields,
        firstName: 'Baby',
        sex: 'unknown',
        gestation: null,
        dueOn: addDays(today, days),
        prenatalReferralOn: addDays(today, -(3 + index * 7)),
        isCleftProvisional: true,
        cleft: index === 1 ? 'LAHSHAL' : '•••SHAL',
      },
    };
  });

/** Two whose stories are told on purpose. */
const namedStories = (today: PlainDate): SampleStory[] => {
  const tomasz = basicFields(950, 'tomasz');
  const amara = basicFields(951, 'amara');
  const bornTomasz = addMonths(today, -100);
  const bornAmara = addDays(today, -77);
  return [
    {
      id: 'c-tomasz-bielak',
      turn: 'plain',
      toothShift: 6,
      takesMolding: true,
      fields: {
        ...tomasz,
        firstName: 'Tomasz',
        familyName: 'Bielak',
        sex: 'male',
        recordNumber: 'TE-20417',
        cleft: '•••SHAL',
        bornOn: bornTomasz,
        referredOn: bornTomasz,
        leadClinicianId: 'm-obed-nkansah',
        site: 'Tern Quay',
        contacts: [
          {
            name: 'Agnieszka Bielak',
            relation: 'mother',
            phone: '01632 960417',
            email: 'bielak@example.org',
            language: 'Polish',
            needsInterpreter: true,
            mayConsent: true,
          },
        ],
        alerts: [
          { kind: 'latex', text: 'Latex allergy' },
          { kind: 'interpreter', text: 'Interpreter, Polish' },
        ],
      },
    },
    {
      id: 'c-amara-okoye',
      turn: 'plain',
      toothShift: 0,
      takesMolding: true,
      fields: {
        ...amara,
        firstName: 'Amara',
        familyName: 'Okoye',
        sex: 'female',
        recordNumber: 'TE-20977',
        cleft: 'LAHS•••',
        bornOn: bornAmara,
        referredOn: bornAmara,
        leadClinicianId: 'm-obed-nkansah',
        site: 'Tern Quay',
        contacts: [
          {
            name: 'Ngozi Okoye',
            relation: 'mother',
            phone: '01632 960977',
            email: 'okoye@example.org',
            language: 'English',
            needsInterpreter: false,
            mayConsent: true,
          },
        ],
        alerts: [],
      },
    },
  ];
};

/** A seed whose name no child before it has; after a few tries a namesake is let through, as in life. */
const freshSeed = (index: number, taken: Set<string>): string => {
  const seeds = ['', 'b', 'c', 'd', 'e', 'f', 'g', 'h'].map((letter) => `child${index}${letter}`);
  const nameOf = (seed: string): string => {
    const { firstName, familyName } = basicFields(index, seed);
    return `${firstName} ${familyName}`;
  };
  const seed = seeds.find((one) => !taken.has(nameOf(one))) ?? `child${index}`;
  taken.add(nameOf(seed));
  return seed;
};

export const sampleStories = (today: PlainDate): SampleStory[] => {
  const turns = new Map(turnsBySlot);
  const taken = new Set<string>();
  const stories = agesInDays().map((age, index): SampleStory => {
    const seed = freshSeed(index, taken);
    const turn = turns.get(index) ?? 'plain';
    const bornOn = addDays(today, -age);
    const fields = turned(basicFields(index, seed), turn, bornOn, today, seed);
    return {
      id: `c-${String(index + 1).padStart(3, '0')}`,
      turn,
      fields,
      toothShift: Math.round((chance(`${seed}tooth`) - 0.5) * 16),
      takesMolding: chance(`${seed}mold`) < 0.85,
    };
  });
  return [...namedStories(today), ...stories, ...expectedStories(today)];
};
