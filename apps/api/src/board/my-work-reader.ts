/** Whose work page is made, and what that person may do. */
import type { Knex } from 'knex';
import { canMilestone } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import { partSubject } from '@weftway/abilities/milestone-subject';
import type { Action } from '@weftway/abilities/permission-table';
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import type { Actor } from '../http/endpoint.ts';
import { placeKey } from './my-work-view.ts';
import type { KeptDraft, TeamMember, WorkRow } from './my-work-view.ts';

export const dayOf = (instant: string): string => formatDate(instant.slice(0, 10) as PlainDate); // an instant begins with its date
export const day = (text: string): string => formatDate(text as PlainDate); // stored as a checked date

export interface Reader {
  readonly db: Knex;
  readonly actor: Actor;
  readonly ability: WeftwayAbility;
  readonly today: PlainDate;
  readonly team: ReadonlyMap<string, TeamMember>;
  readonly rules: ReadonlyMap<string, MilestoneRule>;
}

export const partKey = (childId: string, milestone: string, part: string): string =>
  `${placeKey(childId, milestone)} ${part}`;
export const nameIn = (reader: Reader, id: string): string => reader.team.get(id)?.name ?? '';

/** The part of a row that a right is asked for. */
export interface AskedPart {
  readonly row: WorkRow;
  readonly part: string;
  readonly ownerId: string | null;
}

/** May the reader do this to a part of a row? `trainees` are those of the child. */
export const may = (
  reader: Reader,
  action: Action,
  { row, part, ownerId }: AskedPart,
  trainees: readonly string[],
): boolean => {
  const rule = reader.rules.get(row.milestone_id);
  if (rule === undefined) return false;
  const child = { leadClinicianId: row.lead_clinician_id, trainees };
  return canMilestone(reader.ability, action, partSubject(rule, part, child, ownerId));
};

export const draftNote = (reader: Reader, draft: KeptDraft): string => {
  const { actor } = reader;
  if (draft.by_id !== actor.id) return `Drafted by ${nameIn(reader, draft.by_id)} on ${dayOf(draft.at)}`;
  if (draft.is_ready === 0) return `Draft kept on ${dayOf(draft.at)}`;
  return actor.supervisorId === null
    ? `Drafted by you on ${dayOf(draft.at)}`
    : `Waits for a signature since ${dayOf(draft.at)}`;
};
