import { editTeamSettings } from '@weftway/contract/team-settings';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { childrenBySite, teamSettings } from './team-settings-view.ts';

/** A site stays while children are seen there; a new zone is the team's clock at once. */
export const editTeamSettingsEndpoint = endpoint<typeof editTeamSettings>({
  operation: editTeamSettings,
  can: { action: 'manage', subject: 'Team' },
  version: ({ version }) => version,
  handle: async ({ trx, services, body, ifMatch }) => {
    const current = await teamSettings(trx, services);
    if (current.version !== ifMatch)
      return refused('changed-meanwhile', {
        detail: 'Somebody else changed the settings of the team.',
        extra: { current },
      });
    const children = await childrenBySite(trx);
    const lost = current.sites.filter((site) => !body.sites.includes(site) && (children.get(site) ?? 0) > 0);
    if (lost.length > 0) {
      const where = lost.map((site) => `${site} (${String(children.get(site))})`).join(', ');
      return fieldRefused('/sites', `Children are seen at ${where}. Move them to another site first.`);
    }
    const { name, zone, sites } = current;
    return done([{ kind: 'team-settings-changed', before: { name, zone, sites }, after: body }], async () => {
      services.useZone?.(body.zone);
      return teamSettings(trx, services);
    });
  },
});
