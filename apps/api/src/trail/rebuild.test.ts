import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Knex } from 'knex';
import { openDatabase } from '../db/connection.ts';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  childFields,
  done,
  evidence,
  pathwayIn,
  sign,
  signBody,
  write,
} from '../testing/pathway-builders.ts';
import { rebuild } from './rebuild.ts';

const factTables: Readonly<Record<string, string>> = {
  team: 'id',
  members: 'id',
  protocols: 'version',
  children: 'id',
  assignments: 'child_id, member_id',
  claims: 'child_id, milestone, part',
  drafts: 'child_id, milestone, part',
  signatures: 'rowid',
  imported_completions: 'child_id, milestone, performed_on',
  holds: 'child_id, milestone',
  waivers: 'id',
  bookings: 'child_id, milestone',
  findings: 'child_id, name',
  own_milestones: 'child_id, id',
  trail_lines: 'seq',
  trail_payloads: 'seq',
  board_rows: 'child_id, milestone',
};

const rowsOf = async (db: Knex, table: string): Promise<unknown[]> =>
  db.raw(`select * from ${table} order by ${factTables[table] ?? '1'}`);

/** Everything that can happen to children, through the API where it has an operation here. */
const live = async (test: TestApp): Promise<void> => {
  const [mara, noor, tove] = [
    await addChild(test, { bornOn: '2026-03-01' }),
    await addChild(test, { bornOn: '2017-10-01', cleft: 'LAHSHAL' }),
    await addChild(test, { bornOn: '2022-01-01' }),
  ];
  const surgeon = await test.as('surgeon');
  const coordinator = await test.as('coordinator');
  const at = (child: string, milestone: string, act: string) => `/children/${child}/milestones/${milestone}/${act}`;
  await write(test, [{ kind: 'trainees-assigned', childId: mara, after: { memberIds: ['trainee'] } }]);
  pathwayIn(
    await (
      await test.as('trainee')
    )
      .put(at(mara, 'TEAM-04', 'draft'), { ...signBody('TEAM-04', {}, '2026-12-01'), isReady: true })
      .set('if-match', '"0"'),
  );
  pathwayIn(await sign(test, surgeon, mara, 'TEAM-04'));
  pathwayIn(await surgeon.post(at(mara, 'SURG-01', 'claim'), { part: 'milestone' }));
  pathwayIn(
    await coordinator.post(at(mara, 'SURG-01', 'hand-over'), { part: 'milestone', to: 'surgeon-2', from: 'surgeon' }),
  );
  pathwayIn(
    await (await test.as('surgeon-2')).post(at(mara, 'SURG-01', 'release'), { part: 'milestone', reason: 'On leave' }),
  );
  pathwayIn(await coordinator.put(at(mara, 'SURG-03', 'booking'), { on: '2027-03-01', reason: '' }));
  pathwayIn(await coordinator.put(at(mara, 'SURG-03', 'booking'), { on: '2027-03-08', reason: 'Theatre closed' }));
  const overrides = [{ check: 'CARE-04:SURG-01', reason: 'Seen on the day', secondName: null }];
  const lip = pathwayIn(
    await sign(test, surgeon, mara, 'SURG-01', { performedOn: '2026-11-20', overrides }),
  ).signatures.at(-1);
  pathwayIn(
    await surgeon.post(at(mara, 'SURG-01', 'amendments'), {
      signatureId: lip?.id,
      performedOn: '2026-11-18',
      values: evidence('SURG-01', 'milestone'),
      reason: 'Wrong day',
      password: testPassword,
    }),
  );
  pathwayIn(await surgeon.put(at(mara, 'SURG-02', 'hold'), { hold: { reason: 'A cold', reviewOn: '2026-12-20' } }));
  pathwayIn(await surgeon.put(at(mara, 'SURG-04', 'hold'), { hold: { reason: 'A cold', reviewOn: '2026-12-20' } }));
  pathwayIn(await surgeon.put(at(mara, 'SURG-04', 'hold'), { hold: null }));
  pathwayIn(
    await (
      await test.as('psychologist')
    ).post(at(mara, 'PSY-01', 'waiver'), {
      kind: 'waived',
      reason: 'Carer declines',
      note: 'Kindly',
      secondName: null,
      offerAgainOn: null,
      password: testPassword,
    }),
  );
  pathwayIn(
    await surgeon.post(`/children/${mara}/own-milestones`, {
      catalogueId: 'OWN-02',
      title: 'Lip touch-up',
      earliest: '2027-06-01',
      target: '2027-07-01',
      latest: '2027-09-01',
      reason: 'Wish of the family',
    }),
  );
  await write(test, [
    done(noor, 'ORTH-02', '2026-10-01', { root_stage_right: '1/2', root_stage_left: '1/3' }),
    done(noor, 'SURG-03', '2018-09-01', {}, true),
    done(noor, 'SURG-01', '2018-02-01', {}, true),
  ]);
  pathwayIn(await surgeon.post(at(noor, 'SURG-03', 'confirmation'), { password: testPassword }));
  pathwayIn(
    await surgeon.post(`/children/${tove}/findings`, {
      name: 'vpi_suspected',
      on: '2026-11-30',
      isPresent: true,
      note: 'At school',
    }),
  );
  pathwayIn(
    await surgeon.post(`/children/${noor}/findings`, {
      name: 'vpi_suspected',
      on: '2026-11-30',
      isPresent: true,
      note: '',
    }),
  );
  pathwayIn(
    await surgeon.post(`/children/${noor}/findings`, {
      name: 'vpi_suspected',
      on: '2026-11-30',
      isPresent: false,
      note: 'Wrong child',
    }),
  );
  pathwayIn(await coordinator.put(at(mara, 'SURG-03', 'booking'), { on: null, reason: 'To be found again' }));
  await write(test, [
    {
      kind: 'child-edited',
      childId: tove,
      before: { fields: childFields('TE-7000') },
      after: { fields: childFields('TE-7001', { bornOn: '2022-01-02', syndromes: ['Stickler'] }) },
    },
    {
      kind: 'child-transferred',
      childId: noor,
      after: { on: '2026-11-30', to: 'Northern team', reason: 'Moved house' },
    },
    { kind: 'child-returned', childId: noor, after: { reason: 'Came back' } },
    { kind: 'care-ended', childId: tove, after: { on: '2026-12-01', reason: 'Wish of the family' } },
    {
      kind: 'cover-set',
      memberId: 'nurse',
      after: { cover: { byId: 'nurse-2', from: '2026-12-10', until: '2026-12-20' } },
    },
    { kind: 'lead-handed-on', childId: mara, after: { leadClinicianId: 'dentist', reason: 'Retires' } },
    { kind: 'team-settings-changed', after: { name: 'Tern Estuary', zone: 'UTC', sites: ['Tern Quay', 'Saltmarsh'] } },
    { kind: 'signed-out', memberId: 'dentist-2', after: { because: 'left', sessions: 2 } },
    { kind: 'member-left', memberId: 'dentist-2', after: { leftOn: '2026-12-01', reason: 'Retired' } },
  ]);
};

describe('the trail', () => {
  let test: TestApp;
  let again: Knex;
  beforeAll(async () => {
    test = await createTestApp();
    again = openDatabase(':memory:');
    await again.migrate.latest();
    await live(test);
  });
  afterAll(async () => {
    await again.destroy();
    await test.close();
  });

  it('makes every table of facts and the board again, row by row', async () => {
    const lines = await rebuild(test.db, again, test.services.today());
    expect(lines).toBeGreaterThan(100);
    for (const table of Object.keys(factTables))
      expect(await rowsOf(again, table), table).toEqual(await rowsOf(test.db, table));
  });

  it('refuses to make something else of a line that was changed', async () => {
    const empty = openDatabase(':memory:');
    await empty.migrate.latest();
    await test.db.raw('drop trigger trail_payloads_no_update');
    await test
      .db('trail_payloads')
      .where('after', 'like', '%Theatre closed%')
      .update({ after: '{"on":"2027-05-05","reason":"Theatre closed"}' });
    await expect(rebuild(test.db, empty, test.services.today())).rejects.toThrow('does not come out as it was written');
    await empty.destroy();
  });
});
