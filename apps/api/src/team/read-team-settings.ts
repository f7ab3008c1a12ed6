import { readTeamSettings } from '@weftway/contract/team-settings';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { teamSettings } from './team-settings-view.ts';

export const readTeamSettingsEndpoint = endpoint<typeof readTeamSettings>({
  operation: readTeamSettings,
  can: { action: 'manage', subject: 'Team' },
  version: ({ version }) => version,
  handle: async ({ trx, services }) => answered(await teamSettings(trx, services)),
});
