/** Board and child page on the server, against the plain programs; and one child after a sign-off. */
import { projectChildren } from '../src/pathways/project-children.ts';
import { BoardCache } from '../src/board/board-cache.ts';
import { readStamp } from '../src/board/board-view.ts';
import { childrenOnBoard, rowsEach } from './bench-team.ts';
import type { BenchTeam } from './bench-team.ts';
import { cpuOf, head, inTurns, line, ratioLine } from './measure.ts';
import { openReferenceServer } from './reference-server.ts';
import { benchToday } from './sample-facts.ts';
import { openVisitor, signInAs } from './visits.ts';

const rounds = 7;

/** One child changed: its rows are on another version now. */
const touchOne = async ({ db, childIds }: BenchTeam, at: number): Promise<void> => {
  await db.raw('update board_counter set version = version + 1');
  await db.raw(
    'update board_children set changed_at_version = (select version from board_counter) where child_id = ?',
    [childIds[at % childrenOnBoard] ?? ''],
  );
};

/** Each of these children has one milestone claimed, or let go when it is: planned anew, changed rows written, committed. */
const claimOne = async ({ db }: BenchTeam, childIds: readonly string[]): Promise<void> => {
  for (const childId of childIds) {
    await db.transaction(async (trx) => {
      const row = { child_id: childId, milestone: 'TEAM-05', part: 'record' };
      const gone = await trx('claims').where(row).delete();
      if (gone === 0)
        await trx('claims').insert({ ...row, member_id: 'coordinator', since: `${benchToday}T08:00:00.000Z` });
      await projectChildren(trx, [childId], benchToday);
    });
  }
};

export const benchServer = async (team: BenchTeam): Promise<void> => {
  const reference = await openReferenceServer(team.databaseFile);
  const visitor = openVisitor();
  const cookie = await signInAs(team.address, 'coordinator');
  const board = { url: `${team.address}/api/v1/board`, headers: { cookie, 'accept-encoding': 'gzip' }, times: 1 };
  const changes = (since: number) => ({ ...board, url: `${team.address}/api/v1/board/changes?since=${String(since)}` });
  const everyone = { key: 'all', sees: () => true };
  let at = 0;
  const afterOneChange = async (asked: typeof board): Promise<number> => {
    await touchOne(team, (at += 1));
    return visitor.cost(asked);
  };

  const first = await visitor.ask(board);
  head(
    `Board of ${String(childrenOnBoard)} children × ${String(rowsEach)} milestones, ${team.childIds.length.toLocaleString('en')} children in all, CPU a request`,
  );
  const cost = await inTurns(rounds, {
    reference: () => visitor.cost({ url: `${reference.address}/board`, headers: {}, times: 5 }),
    changed: () => afterOneChange(board),
    cold: async () => {
      const stamp = await readStamp(team.db);
      return cpuOf(() => new BoardCache().read(team.db, stamp, benchToday, everyone));
    },
    same: async () => {
      const { etag } = await visitor.ask(board);
      return visitor.cost({ ...board, headers: { ...board.headers, 'if-none-match': etag }, times: 40 });
    },
    kept: () => visitor.cost({ ...board, times: 40 }),
    feed: async () => afterOneChange(changes((await readStamp(team.db)).version)),
  });
  line('reference: plain Express, nested objects', `${cost.reference.toFixed(1)} ms`, '', null);
  ratioLine('changed since last time (one child)', cost.changed, cost.reference, 0.6, 'ms');
  ratioLine('made from nothing, as after a start', cost.cold, cost.reference, 0.6, 'ms');
  ratioLine('unchanged, answered with 304', cost.same, cost.reference, 0.03, 'ms');
  ratioLine('unchanged, kept bytes sent again', cost.kept, cost.reference, 0.03, 'ms');
  ratioLine('what changed since, one child', cost.feed, cost.reference, 0.6, 'ms');
  line('bytes on the wire', `${(first.bytes / 1000).toFixed(1)} kB`, 'aim ≤ 90 kB', first.bytes <= 90_000);
  const { version } = await readStamp(team.db);
  await touchOne(team, 1);
  const fed = await visitor.ask(changes(version));
  line('bytes of the change of one child', `${(fed.bytes / 1000).toFixed(2)} kB`, 'grows with the changes alone', null);

  head('One child, CPU');
  const childId = team.childIds[team.childIds.length - 1] ?? '';
  const signed = team.childIds.slice(-10);
  await team.db.transaction((trx) => projectChildren(trx, signed, benchToday));
  const child = await inTurns(rounds, {
    reference: () => visitor.cost({ url: `${reference.address}/children/${childId}`, headers: {}, times: 60 }),
    page: () => visitor.cost({ ...board, url: `${team.address}/api/v1/children/${childId}/pathway`, times: 60 }),
    project: async () => (await cpuOf(() => claimOne(team, signed))) / signed.length,
  });
  line('reference: plain Express, one child with 45 rows', `${child.reference.toFixed(2)} ms`, '', null);
  ratioLine('child page with sign-in, permission and log of reads', child.page, child.reference, 2.5, 'ms');
  line(
    'one child planned anew after an act, with commit',
    `${child.project.toFixed(2)} ms`,
    'aim ≤ 2 ms',
    child.project <= 2,
  );
  visitor.close();
  reference.close();
};
