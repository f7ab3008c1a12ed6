import { describe, expect, it } from 'vitest';
import { disciplines } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import { standings } from '@weftway/team/standings';
import { abilityFor, canChild, canMilestone, canOfMember, canSome, rolesOf } from './ability-for.ts';
import type { MilestoneSubject, Person } from './ability-for.ts';
import { permissionTable } from './permission-table.ts';
import type { Action, PermissionRow, SubjectName } from './permission-table.ts';

/**
 * Every cell, stated once more by hand. t team, a assigned children, l own lane, b own lane of assigned children,
 * o one's own, - not at all. Columns: coordinator, surgeon, jaw surgeon, paediatrician, nurse, geneticist, every other
 * clinician, trainee, administrator, auditor; families and outside clinicians have no cell anywhere.
 */
const columns = [
  'coordinator',
  'surgeon',
  'jaw-surgeon',
  'paediatrician',
  'nurse',
  'geneticist',
  'others',
  'trainee',
  'administrator',
  'auditor',
] as const;
const stated: Readonly<Record<string, string>> = {
  'read Child': 't t t t t t t a - -',
  'register Child': 't - - - t - - - - -',
  'edit Child': 't - - - t - - - - -',
  'edit-cleft Child': '- t - t t t - - - -',
  'transfer Child': 't - - - - - - - - -',
  'end-care Child': 't t - - t - - - - -',
  'assign Child': 't t t t t t t - - -',
  'move-protocol Child': 't t - - - - - - - -',
  'record-finding Child': '- t t t t t t - - -',
  'add-milestone Child': '- t t t t t t - - -',
  'claim Milestone': 'l l l l l l l b - -',
  'release Milestone': 'o o o o o o o o - -',
  'hand-over Milestone': 't o o o o o o - - -',
  'draft Milestone': 'l l l l l l l b - -',
  'sign Milestone': 'l l l l l l l - - -',
  'amend Milestone': 'l l l l l l l - - -',
  'hold Milestone': '- l l l l l l - - -',
  'waive Milestone': '- l l l l l l - - -',
  'book Milestone': 't l l l l l l - - -',
  'confirm Milestone': '- l l - - - - - - -',
  'read Board': 't t t t t t t a - -',
  'read MyWork': 't t t t t t t a - -',
  'read Team': 't t t t t t t t t t',
  'manage Team': '- - - - - - - - t -',
  'hand-over Team': 't o o o o o o o t -',
  'cover Team': 't o o o o o o - t -',
  'read Protocol': 't t t t t t t t t t',
  'propose Protocol': '- t t t t t t - t -',
  'activate Protocol': '- - - - - - - - t -',
  'read Trail': 't o o o o o o - t t',
  'read-content Trail': 't o o o o o o - - -',
  'verify Trail': 't - - - - - - - t t',
  'run Import': 't - - - - - - - - -',
  'read ApiReference': '- - - - - - - - t -',
};
const letters: Readonly<Record<string, string>> = {
  team: 't',
  assigned: 'a',
  'own-lane': 'l',
  'own-lane-assigned': 'b',
  own: 'o',
};

const personOf = (column: string, id = 'me'): Person =>
  column === 'trainee' || column === 'administrator' || column === 'auditor'
    ? { id, standing: column, disciplines: column === 'trainee' ? ['surgeon'] : [] }
    : { id, standing: 'member', disciplines: [column as Discipline] }; // the other columns are disciplines
const disciplinesOf = (column: string): readonly string[] =>
  column === 'others' ? disciplines.filter((one) => !(columns as readonly string[]).includes(one)) : [column];

const milestone = (change: Partial<MilestoneSubject>): MilestoneSubject => ({
  mayClaim: [],
  maySign: [],
  ownerId: null,
  leadClinicianId: null,
  trainees: [],
  ...change,
});
const table: readonly PermissionRow[] = permissionTable;

describe('the permission table', () => {
  it('has exactly the rows that are stated', () => {
    expect(table.map((row) => `${row.action} ${row.subject}`)).toEqual(Object.keys(stated));
  });

  it.each(table.map((row) => [`${row.action} ${row.subject}`, row] as const))(
    'states every cell of %s',
    (name, row) => {
      const cells = (stated[name] ?? '').split(' ');
      columns.forEach((column, place) => {
        for (const one of disciplinesOf(column)) {
          const person = personOf(one);
          const reaches = rolesOf(person).flatMap((role) => row.who[role] ?? []);
          expect(reaches.map((reach) => letters[reach])[0] ?? '-', `${one}: ${name}`).toBe(cells[place]);
          expect(canSome(abilityFor(person), row.action as Action, row.subject), `${one}: ${name}`).toBe(
            cells[place] !== '-',
          ); // rows hold actions
        }
      });
      for (const standing of standings.filter(
        (one) => !['member', 'trainee', 'administrator', 'auditor'].includes(one),
      )) {
        expect(
          canSome(abilityFor({ id: 'me', standing, disciplines: [] }), row.action as Action, row.subject),
          `${standing}: ${name}`,
        ).toBe(false);
      }
      expect(canSome(abilityFor(null), row.action as Action, row.subject)).toBe(false);
    },
  );
});

describe('what a reach opens', () => {
  const rowsWith = (letter: string, column: string): PermissionRow[] =>
    table.filter(
      (row) =>
        stated[`${row.action} ${row.subject}`]?.split(' ')[columns.indexOf(column as (typeof columns)[number])] ===
        letter,
    );

  it('own lane: milestones that the discipline may claim or sign, no others', () => {
    for (const row of rowsWith('l', 'surgeon')) {
      const ability = abilityFor(personOf('surgeon'));
      const inLane = milestone({ mayClaim: ['surgeon'], maySign: ['surgeon'] });
      expect(canMilestone(ability, row.action as Action, inLane), row.action).toBe(true);
      expect(
        canMilestone(ability, row.action as Action, milestone({ mayClaim: ['nurse'], maySign: ['nurse'] })),
        row.action,
      ).toBe(false);
    }
  });

  it('a surgeon signs only what surgeons sign, and drafts also what surgeons may claim', () => {
    const ability = abilityFor(personOf('surgeon'));
    const claimable = milestone({ mayClaim: ['surgeon'], maySign: ['orthodontist'] });
    expect(
      ['claim', 'draft', 'sign', 'amend', 'hold', 'waive'].map((action) =>
        canMilestone(ability, action as Action, claimable),
      ),
    ).toEqual([true, true, false, false, false, false]);
  });

  it('the coordinator’s own lane is the coordinator’s, never that of another discipline of the same person by this column', () => {
    const both: Person = { id: 'me', standing: 'member', disciplines: ['coordinator', 'nurse'] };
    const ofCoordinator = milestone({ mayClaim: ['coordinator'], maySign: ['coordinator'] });
    expect(canMilestone(abilityFor(both), 'sign', ofCoordinator)).toBe(true);
    expect(canMilestone(abilityFor(both), 'sign', milestone({ maySign: ['nurse'] }))).toBe(true);
    expect(canMilestone(abilityFor(both), 'waive', ofCoordinator)).toBe(false);
    expect(canMilestone(abilityFor(personOf('coordinator')), 'sign', milestone({ maySign: ['nurse'] }))).toBe(false);
  });

  it('the lead clinician’s half is for the named lead of the child, of any clinical discipline, not for a coordinator', () => {
    const lead = milestone({ mayClaim: ['lead-clinician'], maySign: ['lead-clinician'], leadClinicianId: 'me' });
    expect(canMilestone(abilityFor(personOf('dentist')), 'sign', lead)).toBe(true);
    expect(canMilestone(abilityFor(personOf('dentist', 'somebody-else')), 'sign', lead)).toBe(false);
    expect(canMilestone(abilityFor(personOf('coordinator')), 'sign', lead)).toBe(false);
    expect(canMilestone(abilityFor(personOf('trainee')), 'claim', { ...lead, trainees: ['me'] })).toBe(false);
  });

  it('assigned: children and lanes of children that a trainee is assigned to', () => {
    const ability = abilityFor(personOf('trainee'));
    expect([
      canChild(ability, 'read', { trainees: ['me'] }),
      canChild(ability, 'read', { trainees: ['other'] }),
    ]).toEqual([true, false]);
    const inLane = milestone({ mayClaim: ['surgeon'], maySign: ['surgeon'] });
    for (const action of ['claim', 'draft'] as const) {
      expect(
        [canMilestone(ability, action, { ...inLane, trainees: ['me'] }), canMilestone(ability, action, inLane)],
        action,
      ).toEqual([true, false]);
      expect(
        canMilestone(ability, action, milestone({ mayClaim: ['nurse'], maySign: ['nurse'], trainees: ['me'] })),
        action,
      ).toBe(false);
    }
  });

  it('own: what one holds or did oneself', () => {
    for (const [column, actions] of [
      ['surgeon', ['release', 'hand-over']],
      ['trainee', ['release']],
    ] as const) {
      for (const action of actions) {
        expect(
          [
            canMilestone(abilityFor(personOf(column)), action, milestone({ ownerId: 'me' })),
            canMilestone(abilityFor(personOf(column)), action, milestone({ ownerId: 'other' })),
          ],
          `${column} ${action}`,
        ).toEqual([true, false]);
      }
    }
    for (const [action, name] of [
      ['hand-over', 'Team'],
      ['cover', 'Team'],
      ['read', 'Trail'],
      ['read-content', 'Trail'],
    ] as const satisfies readonly (readonly [Action, SubjectName])[]) {
      const ability = abilityFor(personOf('surgeon'));
      expect([canOfMember(ability, action, name, 'me'), canOfMember(ability, action, name, 'other')], action).toEqual([
        true,
        false,
      ]);
    }
  });

  it('team: every child and every holder', () => {
    const coordinator = abilityFor(personOf('coordinator'));
    expect(canChild(coordinator, 'read', { trainees: [] })).toBe(true);
    expect(canMilestone(coordinator, 'hand-over', milestone({ ownerId: 'other' }))).toBe(true);
    expect(canMilestone(coordinator, 'book', milestone({ maySign: ['surgeon'] }))).toBe(true);
    expect(canOfMember(coordinator, 'hand-over', 'Team', 'other')).toBe(true);
  });
});
