/** What holds for the whole team: its name, time zone and sites; and, to be looked at, how this server runs. */
import { z } from 'zod';
import { operation } from './operation.ts';
import { lineSchema, noneSchema, plainDateSchema } from './text-fields.ts';

const isZone = (zone: string): boolean => {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: zone }).resolvedOptions().timeZone !== '' && !/^[+-]/.test(zone);
  } catch {
    return false;
  }
};

export const teamSettingsFieldsSchema = z.strictObject({
  name: lineSchema(80, 'Write the name of the team.'),
  zone: lineSchema(60, 'Write a time zone.').refine(isZone, 'Write a time zone such as Europe/London.'),
  sites: z
    .array(lineSchema(60, 'Write a name, or take this site away.'))
    .min(1, 'Name at least one site.')
    .max(20, 'At most 20 sites.')
    .refine((sites) => new Set(sites.map((site) => site.toLowerCase())).size === sites.length, 'Name each site once.'),
});
export type TeamSettingsFields = z.infer<typeof teamSettingsFieldsSchema>;

export const teamSettingsSchema = z.object({
  name: z.string(),
  zone: z.string(),
  sites: z.array(z.string()),
  version: z.int(),
  mode: z.enum(['demo', 'live']),
  today: plainDateSchema,
  /** The day is fixed, for a demonstration. */
  isTodayFixed: z.boolean(),
  mail: z.enum(['sent', 'kept-here']),
  /** Every limit of the service by its name; times are seconds. */
  limits: z.array(z.object({ name: z.string(), value: z.number() })),
});
export type TeamSettings = z.infer<typeof teamSettingsSchema>;

const plain = { params: noneSchema, query: noneSchema, isRepeatable: false } as const;

export const readTeamSettings = operation({
  ...plain,
  name: 'readTeamSettings',
  group: 'Team',
  summary: 'Name, zone and sites of the team; limits and mode of this server',
  method: 'GET',
  path: '/team-settings',
  ifMatch: 'none',
  body: noneSchema,
  answer: teamSettingsSchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});

export const editTeamSettings = operation({
  ...plain,
  name: 'editTeamSettings',
  group: 'Team',
  summary: 'Change name, zone and sites of the team',
  method: 'PUT',
  path: '/team-settings',
  ifMatch: 'required',
  body: teamSettingsFieldsSchema,
  answer: teamSettingsSchema,
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'changed-meanwhile', 'version-needed', 'forged-request'],
});
