import { plainDate } from '@weftway/calendar/plain-date';
import { disciplines } from '@weftway/team/disciplines';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { Wait } from './pathway-plan.ts';
import type { MilestoneRule } from './protocol.ts';
import { overridableChecks, signingFaults, signsAs } from './sign-off.ts';
import type { Signing } from './sign-off.ts';
import { fieldsOfPart } from './sign-off-evidence.ts';
import type { Person } from './sign-off-person.ts';

const rule = (id: string): MilestoneRule => {
  const found = defaultProtocol.milestones.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`No milestone ${id}.`);
  return found;
};
const person = (id: string, ...held: Person['disciplines']): Person => ({
  id,
  name: `Dr ${id}`,
  standing: 'member',
  disciplines: held,
  isLeadClinician: false,
});
/** Every field of the part left empty for a reason. */
const complete = (of: MilestoneRule, part: string) =>
  Object.fromEntries(
    fieldsOfPart(of, part).map((field) => [field.name, { value: null, emptyBecause: 'Not needed here' }]),
  );

const signing = (id: string, signer: Person, change: Partial<Signing> = {}): Signing => {
  const part = change.part ?? rule(id).signatures[0]?.part ?? '';
  return {
    rule: rule(id),
    part,
    signer,
    values: complete(rule(id), part),
    performedOn: plainDate('2026-12-01'),
    today: plainDate('2026-12-01'),
    birth: plainDate('2026-01-15'),
    planned: { key: id, state: 'open', waitsFor: [], isLapsed: false },
    given: [],
    overrides: [],
    ...change,
  };
};
const codes = (...of: Parameters<typeof signing>) => signingFaults(signing(...of)).map((refusal) => refusal.code);

const wait = (milestone: string, type: Wait['type'], cause: Wait['cause']): Wait => ({
  milestone,
  type,
  cause,
  isMet: cause === 'met',
});
const waiting = (id: string, ...waitsFor: Wait[]): Signing['planned'] => ({
  key: id,
  state: 'open',
  waitsFor,
  isLapsed: false,
});
const surgeon = person('sol', 'surgeon');
const orthodontist = person('ora', 'orthodontist');

describe('who may sign', () => {
  it('is exactly the disciplines of the part, for every milestone of the protocol', () => {
    for (const milestone of defaultProtocol.milestones) {
      for (const { part, disciplines: allowed } of milestone.signatures) {
        for (const discipline of disciplines) {
          const refused = codes(milestone.id, person('x', discipline), { part }).includes('not-your-discipline');
          expect(refused, `${milestone.id} ${part} ${discipline}`).toBe(!allowed.includes(discipline));
        }
      }
    }
  });

  it('is the lead clinician of the child where the protocol says so, but not a coordinator by that name', () => {
    const lead = { ...person('lea', 'dentist'), isLeadClinician: true };
    expect(codes('TEAM-05', lead, { part: 'lead' })).toEqual([]);
    expect(codes('TEAM-05', { ...lead, disciplines: ['coordinator'] }, { part: 'lead' })).toEqual([
      'not-your-discipline',
    ]);
    expect(codes('TEAM-05', { ...lead, isLeadClinician: false }, { part: 'lead' })).toEqual(['not-your-discipline']);
  });

  it('is never a trainee, nor somebody of another standing', () => {
    expect(codes('SURG-01', { ...surgeon, standing: 'trainee' })).toEqual(['trainee-cannot-sign']);
    expect(codes('SURG-01', { ...surgeon, standing: 'administrator' })).toEqual(['not-your-discipline']);
  });

  it('is refused for a part that does not exist', () => {
    expect(codes('SURG-01', surgeon, { part: 'readiness' })).toEqual(['unknown-part']);
  });
});

describe('two signatures', () => {
  const given = [{ part: 'readiness', signerId: 'ora', signedAs: 'orthodontist' }] as const;

  it('come from two people', () => {
    const both = person('ora', 'orthodontist', 'surgeon');
    expect(codes('ORTH-05', both, { part: 'operation', given })).toEqual(['same-person-twice']);
    expect(codes('ORTH-05', surgeon, { part: 'operation', given })).toEqual([]);
  });

  it('come from two disciplines', () => {
    const shared = {
      ...rule('ORTH-05'),
      signatures: rule('ORTH-05').signatures.map((part) => ({
        ...part,
        disciplines: ['surgeon', 'orthodontist'] as const,
      })),
    };
    const asked = signing('ORTH-05', person('oto', 'orthodontist'), {
      part: 'operation',
      given,
      rule: {
        ...shared,
        signatures: shared.signatures.map((part) => ({ ...part, disciplines: [...part.disciplines] })),
      },
    });
    expect(signingFaults(asked).map((refusal) => refusal.code)).toEqual(['same-discipline-twice']);
    expect(signsAs({ ...asked, signer: person('oto', 'orthodontist', 'surgeon') })).toBe('surgeon');
  });

  it('are not given twice', () => {
    expect(codes('ORTH-05', orthodontist, { given })).toEqual(['already-signed']);
  });
});

describe('the state', () => {
  it.each([
    ['signed', 'already-signed'],
    ['waived', 'waived'],
    ['transferred', 'transferred'],
  ] as const)('%s refuses a signature as %s', (state, code) => {
    expect(codes('SURG-01', surgeon, { planned: { key: 'SURG-01', state, waitsFor: [], isLapsed: false } })).toEqual([
      code,
    ]);
  });

  it('off the path refuses, while held, late and ahead do not, because what has happened must be recordable', () => {
    expect(codes('SURG-01', surgeon, { planned: null })).toEqual(['not-on-path']);
    for (const state of ['held', 'late', 'ahead', 'closing'] as const) {
      expect(codes('SURG-01', surgeon, { planned: { key: 'SURG-01', state, waitsFor: [], isLapsed: false } })).toEqual(
        [],
      );
    }
  });
});

describe('the day', () => {
  it('is not in the future and not before birth', () => {
    expect(codes('SURG-01', surgeon, { performedOn: plainDate('2026-12-02') })).toEqual(['in-the-future']);
    expect(codes('SURG-01', surgeon, { performedOn: plainDate('2026-01-14') })).toEqual(['before-birth']);
    expect(codes('SURG-01', surgeon, { performedOn: plainDate('2026-01-15') })).toEqual([]);
    expect(codes('SURG-01', surgeon, { birth: null })).toEqual(['before-birth']);
  });

  it('may lie before birth for the talk before birth', () => {
    expect(codes('TEAM-01', surgeon, { birth: null })).toEqual([]);
  });
});

describe('the record', () => {
  it('names each empty field', () => {
    const faults = signingFaults(
      signing('MOLD-05', person('mo', 'molding-dentist'), { values: { skin_ok: { value: 'yes' } } }),
    );
    expect(faults.map((fault) => fault.field)).toEqual([
      'gap_mm_at_start',
      'stent_side',
      'nostril_blanching',
      'caregiver_cleaning_shown',
    ]);
    expect(faults[0]).toMatchObject({
      code: 'evidence-missing',
      message: 'Gap at the start is empty. Fill it in or say why it is empty.',
    });
  });

  it('asks each signature for its own fields only', () => {
    const values = complete(rule('ORTH-05'), 'readiness');
    expect(codes('ORTH-05', orthodontist, { values })).toEqual([]);
    expect(codes('ORTH-05', surgeon, { part: 'operation', values })).toContain('evidence-missing');
  });

  it('refuses the impossible and asks to confirm the unlikely', () => {
    const values = {
      ...complete(rule('SURG-01'), 'milestone'),
      weight_g: { value: '12' },
      age_days: { value: '1000' },
    };
    expect(codes('SURG-01', surgeon, { values })).toEqual(['evidence-unlikely', 'evidence-impossible']);
    const confirmed = { ...values, weight_g: { value: '5000' }, age_days: { value: '1000', isConfirmed: true } };
    expect(codes('SURG-01', surgeon, { values: confirmed })).toEqual([]);
  });
});

describe('gates and checks', () => {
  it('a gate that is not met cannot be signed past, with or without a reason', () => {
    const planned = waiting('SURG-03', wait('SURG-01', 'gate', 'not-signed'));
    const overrides = [{ check: 'SURG-01', reason: 'Done abroad', secondName: 'Dr Ida' }];
    expect(signingFaults(signing('SURG-03', surgeon, { planned, overrides }))).toEqual([
      { code: 'gate-unmet', milestone: 'SURG-01', message: 'SURG-01 must come first (not signed).' },
    ]);
  });

  it('a check that is not in order takes a reason', () => {
    const planned = waiting('SURG-03', wait('EAR-03', 'check', 'stale'), wait('GEN-01', 'soft', 'not-signed'));
    expect(codes('SURG-03', surgeon, { planned })).toEqual(['check-override-reason-needed']);
    expect(
      codes('SURG-03', surgeon, { planned, overrides: [{ check: 'EAR-03', reason: ' ', secondName: null }] }),
    ).toEqual(['check-override-reason-needed']);
    expect(
      codes('SURG-03', surgeon, {
        planned,
        overrides: [{ check: 'EAR-03', reason: 'Ears examined in theatre', secondName: null }],
      }),
    ).toEqual([]);
  });

  it.each([
    ['SPCH-06', 'CARE-03', 'surgeon'],
    ['GROW-03', 'GROW-02', 'jaw-surgeon'],
  ] as const)('%s past %s takes a second name that is not the signer’s own', (id, check, discipline) => {
    const signer = person('sol', discipline);
    const planned = waiting(id, wait(check, 'check', 'not-signed'));
    const overrides = (secondName: string | null) => [{ check, reason: 'Urgent', secondName }];
    expect(codes(id, signer, { planned, overrides: overrides(null) })).toEqual(['second-name-needed']);
    expect(codes(id, signer, { planned, overrides: overrides(' dr SOL ') })).toEqual(['second-name-needed']);
    expect(codes(id, signer, { planned, overrides: overrides('Dr Ida') })).toEqual([]);
  });

  it('neck vessels that were not imaged take a second name', () => {
    const values = { ...complete(rule('SPCH-06'), 'operation'), neck_vessels_imaged: { value: 'no' } };
    expect(codes('SPCH-06', surgeon, { values })).toEqual(['second-name-needed']);
    expect(
      codes('SPCH-06', surgeon, {
        values,
        overrides: [{ check: 'neck_vessels_imaged', reason: 'Not available', secondName: 'Dr Ida' }],
      }),
    ).toEqual([]);
    expect(codes('SPCH-06', surgeon, { values: { ...values, neck_vessels_imaged: { value: 'not needed' } } })).toEqual(
      [],
    );
  });

  it('checks are asked of who operates, not of who reviewed the plan', () => {
    const planned = waiting('ORTH-05', wait('CARE-04:ORTH-05:R', 'check', 'not-signed'));
    expect(codes('ORTH-05', orthodontist, { planned })).toEqual([]);
    expect(codes('ORTH-05', surgeon, { planned, part: 'operation' })).toEqual(['check-override-reason-needed']);
    expect(overridableChecks(signing('ORTH-05', orthodontist, { planned }))).toEqual([]);
    expect(overridableChecks(signing('ORTH-05', surgeon, { planned, part: 'operation' }))).toEqual([
      { check: 'CARE-04:ORTH-05:R', cause: 'not signed', needsSecondName: false },
    ]);
  });

  it('says every reason at once', () => {
    const planned = waiting('SURG-03', wait('SURG-01', 'gate', 'too-soon'), wait('CARE-04', 'check', 'stale'));
    expect(
      codes('SURG-03', orthodontist, { planned, values: {}, performedOn: plainDate('2027-01-01') }).filter(
        (code, at, all) => all.indexOf(code) === at,
      ),
    ).toEqual([
      'not-your-discipline',
      'in-the-future',
      'evidence-missing',
      'gate-unmet',
      'check-override-reason-needed',
    ]);
  });
});
