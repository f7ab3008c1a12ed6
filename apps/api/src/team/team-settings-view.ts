/** The settings of the team and how this server runs. */
import type { Knex } from 'knex';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { TeamSettings } from '@weftway/contract/team-settings';
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';

interface TeamRow {
  readonly name: string;
  readonly zone: string;
  readonly sites: string;
  readonly version: number;
}

/** `idle.member`, `jsonBytes` ... with their numbers. */
const flat = (value: object, prefix = ''): TeamSettings['limits'] =>
  Object.entries(value).flatMap(([name, one]: [string, unknown]) =>
    typeof one === 'number' ? [{ name: prefix + name, value: one }] : flat(one as object, `${prefix}${name}.`),
  ); // the limits are numbers and groups of numbers

export const teamSettings = async (db: Knex, { env, today }: Services): Promise<TeamSettings> => {
  const row: TeamRow | undefined = await db('team').first('name', 'zone', 'sites', 'version');
  if (row === undefined) throw new Error('The database has no team');
  return {
    name: row.name,
    zone: row.zone,
    sites: JSON.parse(row.sites) as string[], // written from the contract
    version: row.version,
    mode: env.isDemo ? 'demo' : 'live',
    today: today() as PlainDate, // the team's local date
    isTodayFixed: env.today !== null,
    mail: env.smtp === null ? 'kept-here' : 'sent',
    limits: flat(limits),
  };
};

/** How many children in care are seen at each site. */
export const childrenBySite = async (db: Knex): Promise<ReadonlyMap<string, number>> => {
  const rows = (await db('children')
    .whereNull('care_ended_on')
    .groupBy('site')
    .select('site', db.raw('count(*) as total'))) as { site: string; total: number }[]; // the two columns selected
  return new Map(rows.map(({ site, total }) => [site, total]));
};
