/** The whole demo: children with their acts, so that every state of the pathway stands on the board on the day of the seed. */
import { addDays, daysBetween } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { PlannedMilestone } from '@weftway/pathway/pathway-plan';
import { milestoneCatalogue, ownMilestone } from '@weftway/pathway/milestone-catalogue';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { chance, oneOf } from './chance.ts';
import { evidenceFor } from './evidence-values.ts';
import { membersWith, sampleMembers } from './members.ts';
import type { SampleAct, SampleChild } from './sample-acts.ts';
import { sampleStories } from './sample-children.ts';
import type { SampleStory } from './sample-children.ts';
import { instantFor, playLife } from './sample-history.ts';
import type { Life, LifeSetting } from './sample-history.ts';

/** Days by which a slow course runs late; a lip repair after ten months leaves the palate no room. */
const delaysOf = (turn: SampleStory['turn']): Readonly<Record<string, number>> => {
  if (turn === 'slow-lip') return { 'SURG-01': 150, 'MOLD-06': 60 };
  return turn === 'squeezed' ? { 'SURG-01': 222, 'MOLD-06': 60 } : {};
};

const settingOf = (story: SampleStory, protocol: Protocol, today: PlainDate): LifeSetting => {
  const born = story.fields.bornOn ?? today;
  const isLateArrival = story.turn === 'late-arrival' || story.turn === 'unverified';
  return {
    id: story.id,
    fields: story.fields,
    protocol,
    today,
    silentFrom: story.turn === 'lost' ? addDays(today, -780) : story.turn === 'quiet' ? addDays(today, -250) : null,
    delays: delaysOf(story.turn),
    neverDone: story.turn === 'lapsed' ? ['MOLD-01'] : [],
    imported: isLateArrival
      ? [
          {
            milestone: 'SURG-01',
            on: addDays(born, 300),
            precision: 'month',
            isUnverified: story.turn === 'unverified',
          },
        ]
      : [],
    takesMolding: story.takesMolding,
    toothShift: story.toothShift,
  };
};

const finished: readonly string[] = ['signed', 'waived', 'transferred'];
const horizonDays = 180;
const unownedShare = 0.14;

const ruleOf = (protocol: Protocol, id: string): MilestoneRule | undefined =>
  protocol.milestones.find((rule) => rule.id === id);

/** Who holds what is open: most of it has an owner, some of it nobody. */
const claims = (story: SampleStory, life: Life, protocol: Protocol, today: PlainDate): SampleAct[] =>
  life.plan.milestones.flatMap((planned): SampleAct[] => {
    const rule = ruleOf(protocol, planned.id);
    if (rule === undefined || finished.includes(planned.state)) return [];
    if (
      planned.state === 'ahead' &&
      (planned.window === null || daysBetween(today, planned.window.earliest) > horizonDays)
    )
      return [];
    return rule.signatures.flatMap(({ part, disciplines }, index): SampleAct[] => {
      const seed = `${story.id}${planned.key}${part}`;
      if (chance(`${seed}owner`) < unownedShare) return [];
      const wanted = index === 0 ? [...rule.mayClaim, ...disciplines] : disciplines;
      const able = disciplines.includes('lead-clinician')
        ? sampleMembers.filter((member) => member.id === story.fields.leadClinicianId)
        : membersWith(disciplines.length > 0 ? disciplines : wanted, 0);
      if (able.length === 0) return [];
      const memberId = oneOf(able, `${story.id}${rule.lane}`).id;
      const at = instantFor(addDays(today, -Math.floor(3 + chance(`${seed}since`) * 40)), seed);
      return [{ kind: 'claim', at, byId: memberId, milestone: planned.key, part, memberId }];
    });
  });

const open: readonly string[] = ['open', 'closing', 'late', 'waiting'];

const firstOpen = (life: Life, wanted: (planned: PlannedMilestone) => boolean): PlannedMilestone | undefined =>
  life.plan.milestones.find((planned) => open.includes(planned.state) && wanted(planned));

const evidenceNow = (story: SampleStory, rule: MilestoneRule, part: string, on: PlainDate) =>
  evidenceFor(rule, part, {
    seed: `${story.id}#now`,
    on,
    ageMonths: Math.round(daysBetween(story.fields.bornOn ?? on, on) / 30.4375),
    cleft: story.fields.cleft,
    toothShift: story.toothShift,
    moldingWeeks: 8,
    isRobin: false,
    takesMolding: true,
    signerName: '',
  });

const held = (story: SampleStory, life: Life, today: PlainDate): SampleAct[] => {
  const planned = firstOpen(life, (one) => one.id !== 'TEAM-05');
  if (planned === undefined) return [];
  const reason = oneOf(
    ['Family asked for time after a move', 'Chest infection; repeat the check first', 'Waiting for the sleep study'],
    story.id,
  );
  return [
    {
      kind: 'hold',
      at: instantFor(addDays(today, -12), story.id),
      byId: 'm-wen-zhao',
      milestone: planned.key,
      reason,
      heldOn: addDays(today, -12),
      reviewOn: addDays(today, 21),
    },
  ];
};

const halfSigned = (story: SampleStory, life: Life, protocol: Protocol, today: PlainDate): SampleAct[] => {
  const planned = firstOpen(
    life,
    (one) =>
      (ruleOf(protocol, one.id)?.signatures.length ?? 1) > 1 &&
      !one.waitsFor.some((wait) => wait.type === 'gate' && !wait.isMet),
  );
  const rule = planned === undefined ? undefined : ruleOf(protocol, planned.id);
  const first = rule?.signatures[0];
  if (planned === undefined || rule === undefined || first === undefined) return [];
  const on = addDays(today, -4);
  const signerId = oneOf(membersWith(first.disciplines, 0), `${story.id}${rule.lane}`).id;
  return [
    {
      kind: 'sign',
      at: instantFor(on, `${story.id}half`),
      byId: signerId,
      milestone: planned.key,
      part: first.part,
      occurrence: planned.occurrence,
      performedOn: on,
      values: evidenceNow(story, rule, first.part, on),
      signerId,
      draftedById: null,
    },
  ];
};

const drafted = (story: SampleStory, life: Life, protocol: Protocol, today: PlainDate): SampleAct[] => {
  const planned = firstOpen(
    life,
    (one) =>
      ['speech', 'surgery'].includes(ruleOf(protocol, one.id)?.lane ?? '') &&
      ruleOf(protocol, one.id)?.signatures.length === 1 &&
      !one.waitsFor.some((wait) => wait.type === 'gate' && !wait.isMet),
  );
  const rule = planned === undefined ? undefined : ruleOf(protocol, planned.id);
  const part = rule?.signatures[0]?.part;
  if (planned === undefined || rule === undefined || part === undefined) return [];
  const byId = rule.lane === 'speech' ? 'm-gwen-osei' : 'm-pavel-novak';
  const on = addDays(today, -2);
  return [
    {
      kind: 'assign',
      at: instantFor(addDays(today, -30), `${story.id}assign`, 7),
      byId: rule.lane === 'speech' ? 'm-shirin-vaziri' : 'm-obed-nkansah',
      memberIds: [byId],
    },
    {
      kind: 'draft',
      at: instantFor(on, `${story.id}draft`),
      byId,
      milestone: planned.key,
      part,
      occurrence: planned.occurrence,
      performedOn: on,
      values: evidenceNow(story, rule, part, on),
      isReady: true,
    },
  ];
};

const waived = (story: SampleStory, life: Life, protocol: Protocol, today: PlainDate): SampleAct[] => {
  const planned = firstOpen(
    life,
    (one) =>
      ['family-and-mind', 'surgery', 'speech', 'orthodontics-and-graft', 'growth-and-jaw'].includes(
        ruleOf(protocol, one.id)?.lane ?? '',
      ) &&
      (ruleOf(protocol, one.id)?.signatures.length ?? 2) === 1 &&
      one.id !== 'SURG-01' &&
      one.id !== 'SURG-03',
  );
  const rule = planned === undefined ? undefined : ruleOf(protocol, planned.id);
  if (planned === undefined || rule === undefined) return [];
  const by = oneOf(membersWith(rule.signatures[0]?.disciplines ?? [], 0), story.id).id;
  return [
    {
      kind: 'waive',
      at: instantFor(addDays(today, -20), story.id),
      byId: by,
      milestone: planned.key,
      occurrence: planned.occurrence,
      waivedOn: addDays(today, -20),
      reason: 'Family choice',
      note: 'Talked through at the last visit; will be offered again.',
      waiverKind: 'waived',
    },
  ];
};

/** A milestone outside the protocol, running on the day of the seed. */
const ownAct = (story: SampleStory, today: PlainDate): SampleAct[] => {
  const template = milestoneCatalogue.find((one) => one.title === 'Lip revision') ?? milestoneCatalogue[0];
  if (template === undefined) return [];
  const addedOn = addDays(today, -15);
  const added = ownMilestone(template, {
    number: 1,
    title: template.title,
    addedOn,
    earliest: addedOn,
    target: addDays(today, 60),
    latest: addDays(today, 150),
  });
  return [
    {
      kind: 'own',
      at: instantFor(addedOn, story.id),
      byId: 'm-obed-nkansah',
      ...added,
      reason: 'Asked for by the child and the family',
    },
  ];
};

const lastWords = (story: SampleStory, life: Life, protocol: Protocol, today: PlainDate): SampleAct[] => {
  switch (story.turn) {
    case 'held':
      return held(story, life, today);
    case 'half-signed':
      return halfSigned(story, life, protocol, today);
    case 'drafted':
      return drafted(story, life, protocol, today);
    case 'waived':
      return waived(story, life, protocol, today);
    case 'transferred':
      return [
        {
          kind: 'transfer',
          at: instantFor(addDays(today, -90), story.id, 15),
          byId: 'm-ruth-alder',
          on: addDays(today, -90),
          to: 'Lark Valley Cleft Team',
          reason: 'Family moved',
        },
      ];
    case 'own-milestone':
      return ownAct(story, today);
    default:
      return [];
  }
};

const registerAct = (story: SampleStory, today: PlainDate): SampleAct => {
  const { fields } = story;
  const day = fields.teamStartOn ?? fields.prenatalReferralOn ?? fields.referredOn ?? today;
  return { kind: 'register', at: instantFor(day, story.id, 0), byId: 'm-ruth-alder', fields };
};

const traineesOf = (story: SampleStory, today: PlainDate): SampleAct[] =>
  chance(`${story.id}trainee`) < 0.16 && story.turn !== 'drafted'
    ? [
        {
          kind: 'assign',
          at: instantFor(addDays(today, -30), `${story.id}assign`, 7),
          byId: 'm-obed-nkansah',
          memberIds: chance(`${story.id}which`) < 0.5 ? ['m-pavel-novak'] : ['m-pavel-novak', 'm-gwen-osei'],
        },
      ]
    : [];

/** Nothing is recorded before the child is registered. */
const afterRegistration = (acts: readonly SampleAct[]): SampleAct[] => {
  const first = acts[0]?.at ?? '';
  return acts.map((act, index) =>
    act.at > first || index === 0 ? act : { ...act, at: new Date(Date.parse(first) + index * 1000).toISOString() },
  );
};

/** About 160 children. Equal days and protocols give equal teams. */
export const demoChildren = (protocol: Protocol, today: PlainDate): SampleChild[] =>
  sampleStories(today).map((story) => {
    const life = playLife(settingOf(story, protocol, today));
    const acts = [
      registerAct(story, today),
      ...life.acts,
      ...traineesOf(story, today),
      ...(story.turn === 'lost' ? [] : claims(story, life, protocol, today)),
      ...lastWords(story, life, protocol, today),
    ];
    return { id: story.id, acts: afterRegistration(acts) };
  });
