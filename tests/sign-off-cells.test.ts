/**
 * Who signs which milestone: every part of every milestone of the default protocol, tried by every discipline, by
 * trainees and by one person twice, through the operation itself on a real database.
 */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { abilityFor } from '@weftway/abilities/ability-for';
import { plainDate } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { signingFaults } from '@weftway/pathway/sign-off';
import { disciplines } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import type { Done, Refused } from '../apps/api/src/http/outcome.ts';
import { readSigningSheetEndpoint } from '../apps/api/src/pathways/read-signing-sheet.ts';
import { signMilestoneEndpoint } from '../apps/api/src/pathways/sign-milestone.ts';
import { addChild, done, evidence, write } from '../apps/api/src/testing/pathway-builders.ts';
import { createTestApp } from '../apps/api/src/testing/test-app.ts';
import type { TestApp } from '../apps/api/src/testing/test-app.ts';

interface Signer {
  readonly id: string;
  readonly name: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
}

const member = (one: Discipline): Signer => ({ id: one, name: `Test ${one}`, standing: 'member', disciplines: [one] });

/** Signs as the served operation does once the password is proved; nothing is written. */
const attempt = async (
  test: TestApp,
  childId: string,
  rule: MilestoneRule,
  part: string,
  actor: Signer,
): Promise<Done<unknown> | Refused> => {
  const body = {
    part,
    performedOn: test.services.today(),
    values: evidence(rule.id, part),
    overrides: rule.prerequisites.map((need) => ({
      check: need.milestone,
      reason: 'Seen on the day',
      secondName: 'Dr Other',
    })),
  };
  const ask = {
    trx: test.db,
    ability: abilityFor(actor),
    actor,
    today: test.services.today(),
    now: test.services.now().toISOString(),
    services: test.services,
    params: { childId, milestone: rule.id },
    body,
  };
  const sign = async (digest: string) =>
    (await signMilestoneEndpoint.handle({ ...ask, body: { ...body, digest } } as never)) as Done<unknown> | Refused; // the operation's own answer
  // Whoever may not sign is told so before any digest is looked at.
  const blind = await sign('none');
  if (blind.kind === 'refused' && blind.problem === 'not-allowed') return blind;
  const sheet = (await readSigningSheetEndpoint.handle(ask as never)) as Done<{ digest: string }> | Refused; // the operation's own answer
  return sheet.kind === 'done' ? sign((await sheet.answer()).digest) : blind;
};

const day = plainDate('2026-12-01');

const verdictOf = (outcome: Done<unknown> | Refused): string => (outcome.kind === 'done' ? 'signed' : outcome.problem);

const cells = defaultProtocol.milestones.flatMap((rule) =>
  rule.signatures.map((signature) => [rule.id, signature.part, rule, signature] as const),
);
const twoParts = defaultProtocol.milestones.filter((rule) => rule.signatures.length === 2);

describe('every signature of the protocol', () => {
  let test: TestApp;
  const children: string[] = [];
  beforeAll(async () => {
    test = await createTestApp();
    // A newborn, a toddler, a schoolchild and a young adult, so that most of the protocol is on some path.
    for (const bornOn of ['2026-11-12', '2025-11-20', '2021-08-01', '2016-11-01', '2008-06-01']) {
      const childId = await addChild(test, {
        bornOn,
        cleft: '•••SHAL',
        flags: ['jaw_surgery_planned'],
        leadClinicianId: 'dentist',
      });
      await write(test, [
        ...['vpi_suspected', 'fistula_symptomatic', 'expansion_needed', 'lateral_missing', 'tubes_decided'].map(
          (name) => ({ kind: 'finding-recorded' as const, childId, after: { name, on: '2026-11-30', note: '' } }),
        ),
        ...(bornOn < '2026' ? [done(childId, 'SURG-01', bornOn < '2025' ? '2022-01-10' : '2026-02-10')] : []),
        ...(bornOn < '2025' ? [done(childId, 'SURG-03', '2022-06-10')] : []),
      ]);
      children.push(childId);
    }
  }, 60_000);
  afterAll(() => test.close());

  const tried = async (rule: MilestoneRule, part: string, actor: Signer): Promise<string[]> => {
    const verdicts: string[] = [];
    for (const childId of children) verdicts.push(verdictOf(await attempt(test, childId, rule, part, actor)));
    return verdicts;
  };

  const openCells = new Set<string>();
  it.each(cells)(
    '%s %s is given by its disciplines and by nobody else',
    async (id, part, rule, signature) => {
      for (const discipline of disciplines) {
        const isLead =
          (signature.disciplines as readonly string[]).includes('lead-clinician') && discipline === 'dentist';
        const isRight = isLead || (signature.disciplines as readonly string[]).includes(discipline);
        const verdicts = await tried(rule, part, member(discipline));
        if (isRight) expect(verdicts, `${discipline} ${id} ${part}`).not.toContain('not-allowed');
        else expect(new Set(verdicts), `${discipline} ${id} ${part}`).toEqual(new Set(['not-allowed']));
        if (verdicts.includes('signed')) openCells.add(`${id} ${part}`);
        const trainee: Signer = { ...member(discipline), standing: 'trainee' };
        expect(new Set(await tried(rule, part, trainee)), `trainee ${discipline} ${id} ${part}`).toEqual(
          new Set(['not-allowed']),
        );
      }
    },
    30_000,
  );

  it('was open to be signed on some child for most of the protocol', () => {
    expect(
      openCells.size,
      [...cells.map(([id, part]) => `${id} ${part}`)].filter((cell) => !openCells.has(cell)).join(', '),
    ).toBeGreaterThan(cells.length * 0.6);
  });

  it.each(twoParts.map((rule) => [rule.id, rule] as const))(
    'of %s is not given twice by one person, nor twice in one discipline',
    async (id, rule) => {
      const [first, second] = rule.signatures;
      if (first === undefined || second === undefined) throw new Error(`${id} has one signature`);
      const everything: Signer = {
        id: 'dentist',
        name: 'Test dentist',
        standing: 'member',
        disciplines: [...disciplines],
      };
      let wasOpen = 0;
      for (const childId of children) {
        const outcome = await attempt(test, childId, rule, first.part, everything);
        if (outcome.kind !== 'done') continue;
        await write(test, outcome.events);
        const again = await attempt(test, childId, rule, second.part, everything);
        expect(verdictOf(again), `${id} on ${childId}`).toBe('milestone-not-ready');
        expect(JSON.stringify(again), id).toContain('same-person-twice');
        wasOpen += 1;
      }
      // Where no child here has it open, the rule itself is asked.
      if (wasOpen === 0) {
        const asked = {
          rule,
          part: second.part,
          signer: { ...everything, isLeadClinician: true },
          values: evidence(id, second.part),
          performedOn: day,
          today: day,
          birth: plainDate('2016-11-01'),
          planned: { key: id, state: 'open', waitsFor: [], isLapsed: false },
          overrides: [],
          given: [{ part: first.part, signerId: everything.id, signedAs: first.disciplines[0] ?? 'surgeon' }],
        } as const;
        expect(
          signingFaults(asked).map(({ code }) => code),
          id,
        ).toEqual(['same-person-twice']);
      }
    },
  );
});
