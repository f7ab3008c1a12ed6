import type { AnyEndpoint } from '../http/endpoint.ts';
import { readLocalInboxEndpoint } from '../mail/read-local-inbox.ts';
import { acceptInvitationEndpoint } from './accept-invitation.ts';
import { askPasswordResetEndpoint } from './ask-password-reset.ts';
import { changePasswordEndpoint } from './change-password.ts';
import { endMySessionEndpoint } from './end-my-session.ts';
import { listMySessionsEndpoint } from './list-my-sessions.ts';
import { openInvitationEndpoint } from './open-invitation.ts';
import { readSessionEndpoint } from './read-session.ts';
import { resetPasswordEndpoint } from './reset-password.ts';
import { signInEndpoint } from './sign-in.ts';
import { signOutEndpoint } from './sign-out.ts';
import { stayedActiveEndpoint } from './stayed-active.ts';

export const signInEndpoints: readonly AnyEndpoint[] = [
  readSessionEndpoint,
  signInEndpoint,
  signOutEndpoint,
  stayedActiveEndpoint,
  askPasswordResetEndpoint,
  resetPasswordEndpoint,
  openInvitationEndpoint,
  acceptInvitationEndpoint,
  changePasswordEndpoint,
  listMySessionsEndpoint,
  endMySessionEndpoint,
  readLocalInboxEndpoint,
];
