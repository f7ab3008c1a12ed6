import type { AnyEndpoint } from '../http/endpoint.ts';
import { editMemberEndpoint } from './edit-member.ts';
import { editTeamSettingsEndpoint } from './edit-team-settings.ts';
import { handOverWorkEndpoint } from './hand-over-work.ts';
import { inviteAgainEndpoint } from './invite-again.ts';
import { inviteMemberEndpoint } from './invite-member.ts';
import { listMembersEndpoint } from './list-members.ts';
import { listOpenClaimsEndpoint } from './list-open-claims.ts';
import { memberLeavesEndpoint } from './member-leaves.ts';
import { readTeamSettingsEndpoint } from './read-team-settings.ts';
import { setCoverEndpoint } from './set-cover.ts';

export const teamEndpoints: readonly AnyEndpoint[] = [
  listMembersEndpoint,
  inviteMemberEndpoint,
  editMemberEndpoint,
  inviteAgainEndpoint,
  listOpenClaimsEndpoint,
  handOverWorkEndpoint,
  memberLeavesEndpoint,
  setCoverEndpoint,
  readTeamSettingsEndpoint,
  editTeamSettingsEndpoint,
];
