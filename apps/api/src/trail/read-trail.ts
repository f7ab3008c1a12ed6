import type { TrailLine } from '@weftway/contract/trail';
import { readTrail } from '@weftway/contract/trail';
import { endpoint } from '../http/endpoint.ts';
import type { AskOfActor } from '../http/endpoint.ts';
import { answered, fieldRefused } from '../http/outcome.ts';
import type { StoredAccessLine } from './access-log.ts';
import { instantsOf } from './read-days.ts';
import { childNamesOf, teamZone, viewTrailLines } from './read-lines-view.ts';
import type { TrailFilter, TrailRow } from './read-lines-view.ts';
import { contentsOf, milestoneWords } from './read-private.ts';
import { trailReachOf } from './trail-reach.ts';
import { lineInWords } from './trail-words.ts';

type Asked = AskOfActor<typeof readTrail>;

const changeLine = async ({ trx, actor }: Asked, row: TrailRow, seesContent: boolean): Promise<TrailLine> => {
  const contents = seesContent ? await contentsOf(trx, row, actor) : { before: null, after: null };
  return {
    seq: row.seq,
    at: row.at,
    kind: row.kind,
    actorId: row.actor_id,
    actorName: row.actor_name,
    actorRole: row.actor_role,
    childId: row.child_id,
    childName: seesContent && row.first_name !== null ? `${row.first_name} ${row.family_name ?? ''}` : null,
    memberId: row.member_id,
    milestone: row.milestone,
    requestId: row.request_id,
    summary: lineInWords(row.kind, await milestoneWords(trx, row)),
    ...contents,
    hash: row.hash,
    log: 'changes',
  };
};

const readLine = (line: StoredAccessLine, names: ReadonlyMap<string, string>): TrailLine => ({
  seq: line.seq,
  at: line.at,
  kind: line.operation,
  actorId: line.actorId,
  actorName: line.actorName,
  actorRole: line.actorRole,
  childId: line.childId === '' ? null : line.childId,
  childName: names.get(line.childId) ?? null,
  memberId: null,
  milestone: null,
  requestId: line.requestId,
  summary: lineInWords(line.operation, null),
  before: null,
  after: null,
  hash: line.hash,
  log: 'reads',
});

const changesOf = async (ask: Asked, filter: TrailFilter, seesContent: boolean): Promise<TrailLine[]> =>
  Promise.all((await viewTrailLines(ask.trx, filter)).map((row) => changeLine(ask, row, seesContent)));

const readsOf = async (ask: Asked, { onlyBy, ...filter }: TrailFilter, seesContent: boolean): Promise<TrailLine[]> => {
  // Somebody who sees only their own reads and asks for a colleague's sees none.
  if (onlyBy !== null && filter.member !== undefined && filter.member !== onlyBy) return [];
  const lines = ask.services.accessLog.read({ ...filter, member: onlyBy ?? filter.member });
  const names = seesContent
    ? await childNamesOf(ask.trx, [...new Set(lines.map((line) => line.childId))])
    : new Map<string, string>();
  return lines.map((line) => readLine(line, names));
};

export const readTrailEndpoint = endpoint<typeof readTrail>({
  operation: readTrail,
  can: { action: 'read', subject: 'Trail' },
  handle: async (ask) => {
    const { cursor, limit, log, child, member, kind, from, to } = ask.query;
    if (cursor !== undefined && !/^\d{1,15}$/.test(cursor))
      return fieldRefused('/cursor', 'This is not a place in the trail. Start again from the first page.');
    if (from !== undefined && to !== undefined && from > to)
      return fieldRefused('/to', 'The last day lies before the first one.');
    const { onlyBy, seesContent } = trailReachOf(ask.ability, ask.actor.id);
    const days = instantsOf({ from, to }, await teamZone(ask.trx));
    const filter: TrailFilter = {
      child,
      member,
      kind,
      onlyBy,
      ...days,
      before: cursor === undefined ? undefined : Number(cursor),
      limit: limit + 1,
    };
    const lines =
      log === 'changes' ? await changesOf(ask, filter, seesContent) : await readsOf(ask, filter, seesContent);
    const items = lines.slice(0, limit);
    const isRecordRead =
      log === 'changes' && seesContent && child !== undefined && items.some((line) => line.childName !== null);
    return answered(
      { items, next: lines.length > limit ? String(items.at(-1)?.seq) : null },
      isRecordRead ? child : undefined,
    );
  },
});
