/** Who is signed in, and the letters, passwords and sessions around it. */
import { queryOptions } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import {
  acceptInvitation,
  askPasswordReset,
  changePassword,
  endMySession,
  listMySessions,
  openInvitation,
  readLocalInbox,
  readSession,
  resetPassword,
  signIn,
  signOut,
  stayedActive,
} from '@weftway/contract/session';
import type { Session } from '@weftway/contract/session';
import { call, rememberToken } from '../api/api-client.ts';

const remember = (session: Session): Session => {
  rememberToken(session.csrfToken);
  return session;
};

const keys = {
  current: ['session'] as const,
  mine: ['sessions', 'mine'] as const,
  inbox: ['letters'] as const,
  invitation: (token: string) => ['invitations', token] as const,
};

export const sessionQueries = {
  /**
   * Changes only by what a person does: signing in or out, or being active. A session that ends by itself locks the
   * screen and leaves this alone, so that nothing on the page is taken away.
   */
  current: () =>
    queryOptions({
      queryKey: keys.current,
      queryFn: async ({ signal }) => remember(await call(readSession, { signal, isBackground: true })),
      staleTime: Number.POSITIVE_INFINITY,
      gcTime: Number.POSITIVE_INFINITY,
      refetchOnWindowFocus: false,
    }),
  mine: () =>
    queryOptions({
      queryKey: keys.mine,
      queryFn: ({ signal }) => call(listMySessions, { signal, isBackground: true }),
    }),
  inbox: () =>
    queryOptions({
      queryKey: keys.inbox,
      queryFn: ({ signal }) => call(readLocalInbox, { signal }),
      staleTime: 0,
      refetchInterval: 5000,
    }),
  /** Looking uses nothing up. */
  invitation: (token: string) =>
    queryOptions({
      queryKey: keys.invitation(token),
      queryFn: ({ signal }) => call(openInvitation, { body: { token }, signal }),
      gcTime: 0,
      retry: false,
      refetchOnWindowFocus: false,
    }),
};

/** What the server knows of this browser; leaves the cache alone and is no activity. */
export const askSession = (): Promise<Session> => call(readSession, { isBackground: true });

const replaceAll = (client: QueryClient) => (session: Session) => {
  client.clear();
  client.setQueryData(keys.current, session);
};

interface Credentials {
  readonly email: string;
  readonly password: string;
}

export const sessionMutations = {
  signIn: (client: QueryClient) => ({
    mutationFn: async (body: Credentials) => remember(await call(signIn, { body })),
    onSuccess: replaceAll(client),
  }),
  /** After the screen was locked: the page stays as it is and fetches afresh. */
  signInAgain: (client: QueryClient) => ({
    mutationFn: async (body: Credentials) => remember(await call(signIn, { body })),
    onSuccess: async (session: Session) => {
      client.setQueryData(keys.current, session);
      await client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    },
  }),
  signOut: (client: QueryClient) => ({
    mutationFn: async () => remember(await call(signOut, {})),
    onSuccess: replaceAll(client),
  }),
  stayedActive: (client: QueryClient) => ({
    mutationFn: async () => remember(await call(stayedActive, {})),
    onSuccess: (session: Session) => client.setQueryData(keys.current, session),
  }),
  askPasswordReset: () => ({ mutationFn: (body: { email: string }) => call(askPasswordReset, { body }) }),
  resetPassword: () => ({ mutationFn: (body: { token: string; password: string }) => call(resetPassword, { body }) }),
  acceptInvitation: () => ({
    mutationFn: (body: { token: string; password: string }) => call(acceptInvitation, { body }),
  }),
  changePassword: (client: QueryClient) => ({
    mutationFn: (body: { current: string; next: string }) => call(changePassword, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.mine }),
  }),
  endMySession: (client: QueryClient) => ({
    mutationFn: (sessionId: string) => call(endMySession, { params: { sessionId } }),
    onSettled: () => client.invalidateQueries({ queryKey: keys.mine }),
  }),
};
