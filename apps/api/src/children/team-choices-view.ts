/** What a child's record may name: sites, lead clinicians and trainees of the team. */
import type { Knex } from 'knex';
import type { Discipline } from '@weftway/team/disciplines';

interface MemberRow {
  readonly id: string;
  readonly name: string;
  readonly standing: string;
  readonly disciplines: string;
}

export const sitesOf = async (db: Knex): Promise<readonly string[]> => {
  const row: { sites: string } | undefined = await db('team').first('sites');
  return row === undefined ? [] : (JSON.parse(row.sites) as string[]); // written when the team was founded
};

const findActive = async (db: Knex, memberId: string): Promise<MemberRow | null> => {
  const row: MemberRow | undefined = await db('members')
    .where({ id: memberId, status: 'active' })
    .first('id', 'name', 'standing', 'disciplines');
  return row ?? null;
};

const leads = (member: MemberRow): boolean =>
  member.standing === 'member' && (JSON.parse(member.disciplines) as Discipline[]).some((one) => one !== 'coordinator'); // written from the contract's schema

export const mayLead = async (db: Knex, memberId: string): Promise<boolean> => {
  const member = await findActive(db, memberId);
  return member !== null && leads(member);
};

export const isTrainee = async (db: Knex, memberId: string): Promise<boolean> =>
  (await findActive(db, memberId))?.standing === 'trainee';

/** Who can open a child's record for somebody: the lead clinician by name, and the coordinators. */
export const whoCanHelp = async (db: Knex, leadClinicianId: string | null): Promise<string> => {
  const lead = leadClinicianId === null ? null : await findActive(db, leadClinicianId);
  const coordinators: { name: string }[] = await db('members')
    .where({ status: 'active', standing: 'member' })
    .whereRaw(`exists (select 1 from json_each(members.disciplines) where value = 'coordinator')`)
    .orderBy('name')
    .limit(2)
    .select('name');
  const people = [
    ...(lead === null ? [] : [`${lead.name} (lead clinician)`]),
    ...coordinators.map(({ name }) => `${name} (coordinator)`),
  ];
  return people.length === 0 ? 'the team coordinator' : people.join(' or ');
};

export interface RecordChoices {
  readonly sites: string[];
  readonly leads: { readonly id: string; readonly name: string }[];
  readonly trainees: { readonly id: string; readonly name: string }[];
}

export const viewRecordChoices = async (db: Knex): Promise<RecordChoices> => {
  const members: MemberRow[] = await db('members')
    .where({ status: 'active' })
    .orderBy('name')
    .select('id', 'name', 'standing', 'disciplines');
  const named = ({ id, name }: MemberRow) => ({ id, name });
  return {
    sites: [...(await sitesOf(db))],
    leads: members.filter(leads).map(named),
    trainees: members.filter(({ standing }) => standing === 'trainee').map(named),
  };
};
