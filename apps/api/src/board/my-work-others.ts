/** What others did or left that belongs on a work page: drafts to sign, loose ends, what is late with them. */
import { canMilestone } from '@weftway/abilities/ability-for';
import { partSubject } from '@weftway/abilities/milestone-subject';
import type { WorkGroup } from '@weftway/contract/board';
import { dayOf, draftNote, may, nameIn, partKey } from './my-work-reader.ts';
import type { Reader } from './my-work-reader.ts';
import {
  placeKey,
  readAssignedTrainees,
  readLateRows,
  readLooseRows,
  readReturns,
  readRowsAt,
} from './my-work-view.ts';
import type { KeptDraft, TrailPlace } from './my-work-view.ts';
import { ownersOfRow } from './work-groups.ts';
import type { WorkEntry } from './work-groups.ts';

const isCoordinating = (reader: Reader): boolean =>
  canMilestone(reader.ability, 'hand-over', {
    mayClaim: [],
    maySign: [],
    ownerId: null,
    leadClinicianId: null,
    trainees: [],
  });

/** Drafts of others that I may sign, and drafts of mine on what I do not hold. */
export const draftEntries = async (
  reader: Reader,
  drafts: readonly KeptDraft[],
): Promise<(readonly [WorkGroup, WorkEntry])[]> => {
  const { db, actor, team } = reader;
  const rows = new Map(
    (
      await readRowsAt(
        db,
        drafts.map((draft) => ({ childId: draft.child_id, milestone: draft.milestone })),
      )
    ).map((row) => [placeKey(row.child_id, row.milestone), row]),
  );
  const trainees = await readAssignedTrainees(db, [...new Set(drafts.map((draft) => draft.child_id))]);
  return drafts.flatMap((draft): (readonly [WorkGroup, WorkEntry])[] => {
    const row = rows.get(placeKey(draft.child_id, draft.milestone));
    const owner = row === undefined ? undefined : ownersOfRow(row).find(([part]) => part === draft.part);
    if (row === undefined || owner === undefined) return [];
    const entry: WorkEntry = { row, part: draft.part, ownerId: owner[1], note: draftNote(reader, draft) };
    if (draft.by_id === actor.id) return [['drafted', entry]];
    const isSupervisor = team.get(draft.by_id)?.supervisor_id === actor.id;
    const isForMe = isSupervisor || owner[1] === null || owner[1] === actor.id || owner[1] === draft.by_id;
    const maySign = may(reader, 'sign', entry, trainees.get(row.child_id) ?? []);
    return draft.is_ready === 1 && isForMe && maySign ? [['toSign', entry]] : [];
  });
};

const releasedNotes = (lines: readonly TrailPlace[]): Map<string, string> => {
  const notes = new Map<string, string>();
  for (const line of lines) {
    const after = JSON.parse(line.after) as { part: string; reason: string }; // payload of the event
    const key = partKey(line.child_id, line.milestone, after.part);
    const why = after.reason === '' ? '' : `: ${after.reason}`;
    if (!notes.has(key)) notes.set(key, `Let go by ${line.actor_name} on ${dayOf(line.at)}${why}`);
  }
  return notes;
};

/** Unowned in the lanes that I may claim; what a colleague let go lately comes back by name. */
export const looseEntries = async (reader: Reader, since: string): Promise<(readonly [WorkGroup, WorkEntry])[]> => {
  const { db, actor, rules } = reader;
  const favourable = { leadClinicianId: actor.id, trainees: [actor.id] };
  const claimable = [...rules.values()].filter((rule) =>
    rule.signatures.some(({ part }) =>
      canMilestone(reader.ability, 'claim', partSubject(rule, part, favourable, null)),
    ),
  );
  const isTrainee = actor.standing === 'trainee';
  const rows = await readLooseRows(
    db,
    claimable.map((rule) => rule.id),
    isTrainee ? actor.id : null,
  );
  const notes = releasedNotes(await readReturns(db, since, ['milestone-released'], actor.id));
  return rows.flatMap((row) =>
    ownersOfRow(row)
      .filter(
        ([part, ownerId]) =>
          ownerId === null && may(reader, 'claim', { row, part, ownerId }, isTrainee ? [actor.id] : []),
      )
      .map(([part]): readonly [WorkGroup, WorkEntry] => {
        const note = notes.get(partKey(row.child_id, row.milestone, part));
        return [note === undefined ? 'looseEnds' : 'cameBack', { row, part, ownerId: null, note: note ?? '' }];
      }),
  );
};

export const lateEntries = async (reader: Reader): Promise<WorkEntry[]> => {
  const { db, actor, team } = reader;
  const traineeIds = [...team.values()]
    .filter((member) => member.supervisor_id === actor.id)
    .map((member) => member.id);
  const rows = await readLateRows(db, { isWholeTeam: isCoordinating(reader), leadId: actor.id, traineeIds });
  return rows.flatMap((row) => {
    const parts = ownersOfRow(row);
    const [part, ownerId] = parts.find(([, owner]) => owner !== null) ?? parts[0] ?? ['', null];
    if (part === '' || parts.some(([, owner]) => owner === actor.id)) return [];
    return [{ row, part, ownerId, note: ownerId === null ? 'No one holds it' : `With ${nameIn(reader, ownerId)}` }];
  });
};
