/** Gathers what belongs on the work page of one person, group by group. */
import type { Knex } from 'knex';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import { addDays } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { WorkGroup } from '@weftway/contract/board';
import type { Actor } from '../http/endpoint.ts';
import { rulesOf } from '../pathways/whole-protocol.ts';
import { activeProtocolVersion, loadProtocol } from '../protocol/protocol-store.ts';
import { draftEntries, lateEntries, looseEntries } from './my-work-others.ts';
import { day, dayOf, draftNote, may, nameIn, partKey } from './my-work-reader.ts';
import type { Reader } from './my-work-reader.ts';
import {
  placeKey,
  readAmendedEntries,
  readClaimedRows,
  readDrafts,
  readHoldsOn,
  readReturns,
  readRowsAt,
  readTeam,
} from './my-work-view.ts';
import type { ClaimedRow, KeptDraft, TeamMember, WorkRow } from './my-work-view.ts';
import { isEvidenceComplete, planChildren } from './work-items.ts';
import type { PlannedChildren } from './work-items.ts';
import { groupOfMine, ownersOfRow, withoutRepeats } from './work-groups.ts';
import type { WorkEntry } from './work-groups.ts';

/** How long something that came back stays marked as such. */
const freshDays = 10;

const unsigned = (row: WorkRow, part: string): boolean => ownersOfRow(row).some(([name]) => name === part);

const mineOf = (rows: readonly ClaimedRow[], memberId: string): WorkEntry[] =>
  rows
    .filter((row) => row.member_id === memberId && unsigned(row, row.part))
    .map((row) => ({ row, part: row.part, ownerId: memberId, note: '' }));

const coversOf = (reader: Reader, rows: readonly ClaimedRow[], covered: readonly TeamMember[]): WorkEntry[] =>
  covered.flatMap((member) =>
    mineOf(rows, member.id)
      .filter(({ row }) => row.state !== 'ahead' && row.state !== 'waiting')
      .map((entry) => ({
        ...entry,
        note: `${member.name}’s work, which you cover until ${day(member.cover_until ?? reader.today)}`,
      })),
  );

/** Handed to me, sent back to me, or up for review, by key of the part. */
const returnedNotes = async (
  reader: Reader,
  drafts: readonly KeptDraft[],
  since: string,
): Promise<Map<string, string>> => {
  const { db, actor, today } = reader;
  const notes = new Map<string, string>();
  for (const line of await readReturns(db, since, ['milestone-handed-over'], actor.id)) {
    const after = JSON.parse(line.after) as { part: string; to: string }; // payload of the event
    if (after.to === actor.id)
      notes.set(
        partKey(line.child_id, line.milestone, after.part),
        `Handed to you by ${line.actor_name} on ${dayOf(line.at)}`,
      );
  }
  for (const draft of drafts) {
    if (draft.by_id === actor.id || draft.is_ready === 1 || draft.at < since) continue;
    notes.set(
      partKey(draft.child_id, draft.milestone, draft.part),
      `Sent back by ${nameIn(reader, draft.by_id)} on ${dayOf(draft.at)}`,
    );
  }
  for (const hold of await readHoldsOn(db, actor.id)) {
    if (hold.review_on <= today)
      notes.set(placeKey(hold.child_id, hold.milestone), `Held until its review on ${day(hold.review_on)}`);
  }
  return notes;
};

const amendedEntries = async (reader: Reader, since: string): Promise<WorkEntry[]> => {
  const amended = await readAmendedEntries(reader.db, reader.actor.id, since);
  const rows = new Map(
    (await readRowsAt(reader.db, amended)).map((row) => [placeKey(row.child_id, row.milestone), row]),
  );
  return amended.flatMap((entry) => {
    const row = rows.get(placeKey(entry.childId, entry.milestone));
    return row === undefined
      ? []
      : [
          {
            row,
            part: entry.part,
            ownerId: reader.actor.id,
            note: `${entry.byName} amended your entry on ${dayOf(entry.at)}`,
          },
        ];
  });
};

/** What I hold, each in its group. */
const groupMine = (
  reader: Reader,
  mine: readonly WorkEntry[],
  drafts: ReadonlyMap<string, KeptDraft>,
  notes: ReadonlyMap<string, string>,
  children: PlannedChildren,
): (readonly [WorkGroup, WorkEntry])[] =>
  mine.flatMap((entry): (readonly [WorkGroup, WorkEntry])[] => {
    const { row, part } = entry;
    const key = partKey(row.child_id, row.milestone, part);
    const note = notes.get(key) ?? notes.get(placeKey(row.child_id, row.milestone));
    if (note !== undefined) return [['cameBack', { ...entry, note }]];
    const draft = drafts.get(key);
    const trainees = children.get(row.child_id)?.record.trainees ?? [];
    const group = groupOfMine(
      entry,
      draft,
      isEvidenceComplete(children, row, part),
      reader.actor.id,
      may(reader, 'sign', entry, trainees),
    );
    if (group === null) return [];
    return [[group, { ...entry, note: draft === undefined ? '' : draftNote(reader, draft) }]];
  });

export const gatherWork = async (db: Knex, actor: Actor, ability: WeftwayAbility, today: PlainDate) => {
  const team = await readTeam(db);
  const reader: Reader = {
    db,
    actor,
    ability,
    today,
    team,
    rules: rulesOf(await loadProtocol(db, await activeProtocolVersion(db))),
  };
  const covered = [...team.values()].filter(
    (one) => one.cover_by_id === actor.id && (one.cover_from ?? '9') <= today && (one.cover_until ?? '') >= today,
  );
  const claimed = await readClaimedRows(db, [actor.id, ...covered.map((one) => one.id)]);
  const drafts = await readDrafts(db, actor.id);
  const since = `${addDays(today, -freshDays)}T00:00:00.000Z`;
  const mine = mineOf(claimed, actor.id);
  // Only what has a draft can be complete; the rest is planned later, when it is known what is shown.
  const drafted = new Set(drafts.map((draft) => draft.child_id));
  const children = await planChildren(
    db,
    [...new Set(mine.map(({ row }) => row.child_id).filter((id) => drafted.has(id)))],
    today,
  );
  const notes = await returnedNotes(reader, drafts, since);
  const draftOfPart = new Map(drafts.map((draft) => [partKey(draft.child_id, draft.milestone, draft.part), draft]));
  const grouped = [
    ...groupMine(reader, mine, draftOfPart, notes, children),
    ...(await draftEntries(reader, drafts)),
    ...(await looseEntries(reader, since)),
    ...(await amendedEntries(reader, since)).map((entry) => ['cameBack', entry] as const),
    ...coversOf(reader, claimed, covered).map((entry) => ['covers', entry] as const),
    ...(await lateEntries(reader)).map((entry) => ['late', entry] as const),
  ];
  const order: readonly WorkGroup[] = [
    'cameBack',
    'toSign',
    'drafted',
    'doNow',
    'waiting',
    'covers',
    'looseEnds',
    'late',
  ];
  const groups = withoutRepeats(
    order.map((group) => [group, grouped.filter(([name]) => name === group).map(([, entry]) => entry)] as const),
  );
  return { team, children, groups };
};
