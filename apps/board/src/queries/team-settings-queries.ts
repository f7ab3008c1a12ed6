/** What holds for the whole team, and how the server runs; for administrators. */
import { queryOptions } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { editTeamSettings, readTeamSettings } from '@weftway/contract/team-settings';
import type { TeamSettings, TeamSettingsFields } from '@weftway/contract/team-settings';
import { call } from '../api/api-client.ts';

const keys = { all: ['team-settings'] as const };

export const teamSettingsQueries = {
  read: () =>
    queryOptions({
      queryKey: keys.all,
      queryFn: ({ signal }) => call(readTeamSettings, { signal }),
    }),
};

export const teamSettingsMutations = {
  edit: (client: QueryClient) => ({
    mutationFn: ({ fields, version }: { fields: TeamSettingsFields; version: number }) =>
      call(editTeamSettings, { body: fields, ifMatch: version }),
    // Name and zone stand in the session, and the sites in the choices of every form.
    onSuccess: async (settings: TeamSettings) => {
      client.setQueryData(keys.all, settings);
      await client.invalidateQueries();
    },
  }),
};
