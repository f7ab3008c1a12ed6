/** Members of the team and the open work that they hold. */
import { queryOptions } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import {
  editMember,
  handOverWork,
  inviteAgain,
  inviteMember,
  listMembers,
  listOpenClaims,
  memberLeaves,
  setCover,
} from '@weftway/contract/member';
import type { Member, MemberFields } from '@weftway/contract/member';
import { call } from '../api/api-client.ts';

const keys = {
  all: ['members'] as const,
  list: ['members', 'list'] as const,
  openClaims: (memberId: string) => ['members', memberId, 'open-claims'] as const,
};

export const memberQueries = {
  list: () =>
    queryOptions({
      queryKey: keys.list,
      queryFn: ({ signal }) => call(listMembers, { signal, isBackground: true }),
      select: ({ members }) => members,
      staleTime: 60_000,
    }),
  openClaims: (memberId: string) =>
    queryOptions({
      queryKey: keys.openClaims(memberId),
      queryFn: ({ signal }) => call(listOpenClaims, { params: { memberId }, signal }),
    }),
};

/** Work that changed hands shows on the board, in my work and on the child's page as well. */
const refresh = (client: QueryClient) => () =>
  client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' });
const refreshMembers = (client: QueryClient) => () => client.invalidateQueries({ queryKey: keys.all });

export interface HandOver {
  readonly memberId: string;
  readonly items: readonly {
    readonly childId: string;
    readonly milestone: string;
    readonly part: string;
    readonly to: string | null;
  }[];
  readonly reason: string;
  /** Who leads the children from now on; null: nobody, on purpose. */
  readonly leadTo?: string | null | undefined;
  /** The same for every try of one intent. */
  readonly key: string;
}

const handOverCall = ({ memberId, items, reason, key }: HandOver) => ({
  params: { memberId },
  body: { items: [...items], reason },
  idempotencyKey: key,
});

export const memberMutations = {
  invite: (client: QueryClient) => ({
    mutationFn: ({ key, ...body }: MemberFields & { readonly key: string }) =>
      call(inviteMember, { body, idempotencyKey: key }),
    onSuccess: refreshMembers(client),
  }),
  edit: (client: QueryClient) => ({
    mutationFn: ({ member, fields }: { member: Member; fields: MemberFields }) =>
      call(editMember, { params: { memberId: member.id }, body: fields, ifMatch: member.version }),
    onSuccess: refreshMembers(client),
  }),
  inviteAgain: (client: QueryClient) => ({
    mutationFn: (memberId: string) => call(inviteAgain, { params: { memberId } }),
    onSuccess: refreshMembers(client),
  }),
  cover: (client: QueryClient) => ({
    mutationFn: ({
      memberId,
      cover,
    }: {
      memberId: string;
      cover: { byId: string; from: string; until: string } | null;
    }) => call(setCover, { params: { memberId }, body: { cover } }),
    onSuccess: refresh(client),
  }),
  handOver: (client: QueryClient) => ({
    mutationFn: (input: HandOver) => call(handOverWork, handOverCall(input)),
    onSuccess: refresh(client),
  }),
  leave: (client: QueryClient) => ({
    mutationFn: ({ leadTo, ...input }: HandOver) => {
      const handOver = handOverCall(input);
      return call(memberLeaves, {
        ...handOver,
        body: leadTo === undefined ? handOver.body : { ...handOver.body, leadTo },
      });
    },
    onSuccess: refresh(client),
  }),
};
