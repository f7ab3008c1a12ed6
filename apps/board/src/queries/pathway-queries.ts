/**
 * A child's pathway. It is never polled: every act answers with the pathway as it now is, which goes straight into the
 * cache, and the live view of the board says when somebody else changed something.
 */
import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { apiPrefix, type AnswerOf, type Operation } from '@weftway/contract/operation';
import {
  amendSignature,
  bookMilestone,
  claimMilestone,
  confirmImported,
  handOverMilestone,
  holdMilestone,
  readPathway,
  readSigningSheet,
  releaseMilestone,
  saveDraft,
  signMilestone,
  waiveMilestone,
  type Pathway,
} from '@weftway/contract/pathway';
import { addOwnMilestone, recordFinding } from '@weftway/contract/pathway-of-child';
import { call, newIdempotencyKey, type CallInput } from '../api/api-client.ts';

/** The pathway as it was before the last act on this screen, so that it can be shown what moved. */
export interface LastAct {
  readonly before: Pathway;
  readonly after: Pathway;
}

export const pathwayQueries = {
  ofChild: (childId: string) =>
    queryOptions({
      queryKey: ['pathways', childId],
      queryFn: ({ signal }) => call(readPathway, { params: { childId }, signal }),
    }),
  lastAct: (childId: string) =>
    queryOptions({
      queryKey: ['pathways', childId, 'last-act'],
      queryFn: (): LastAct | null => null,
      staleTime: Infinity,
      gcTime: Infinity,
    }),
};

/** Writes the answer of an act into the cache; the board and the lists of work are stale from now on. */
const take = (client: QueryClient, childId: string, after: Pathway, mayMove: boolean): void => {
  const { queryKey } = pathwayQueries.ofChild(childId);
  const before = client.getQueryData(queryKey);
  if (before !== undefined && before.version >= after.version && before !== after) return;
  client.setQueryData(queryKey, after);
  if (mayMove) {
    const act: LastAct | null = before === undefined ? null : { before, after };
    client.setQueryData(pathwayQueries.lastAct(childId).queryKey, act);
  }
  for (const noun of ['board', 'my-work', 'children', 'trail']) void client.invalidateQueries({ queryKey: [noun] });
};

type PathwayAct = Operation & { readonly answer: typeof readPathway.answer };

/** Keeps one key for all tries of the same intent; a changed body is another intent. */
const keyPerIntent = () => {
  let last = { body: '', key: '' };
  return (body: unknown): string => {
    const text = JSON.stringify(body);
    if (last.body !== text) last = { body: text, key: newIdempotencyKey() };
    return last.key;
  };
};

export interface Place {
  readonly childId: string;
  readonly milestone: string;
}

const act =
  <O extends PathwayAct>(operation: O, mayMove = true) =>
  (client: QueryClient, place: Place) => {
    const keyFor = keyPerIntent();
    return {
      mutationFn: async (input: {
        readonly body: CallInput<O>['body'];
        readonly ifMatch?: number;
      }): Promise<Pathway> => {
        const key = operation.isRepeatable ? { idempotencyKey: keyFor(input.body) } : {};
        const params = operation.path.includes(':milestone') ? place : { childId: place.childId };
        const sent = {
          params,
          body: input.body,
          ...key,
          ...(input.ifMatch === undefined ? {} : { ifMatch: input.ifMatch }),
        };
        const answer: AnswerOf<PathwayAct> = await call<PathwayAct>(operation, sent);
        return answer;
      },
      onSuccess: (after: Pathway) => take(client, place.childId, after, mayMove),
    };
  };

export const pathwayMutations = {
  claim: act(claimMilestone, false),
  release: act(releaseMilestone, false),
  handOver: act(handOverMilestone, false),
  saveDraft: act(saveDraft, false),
  sign: act(signMilestone),
  amend: act(amendSignature),
  hold: act(holdMilestone),
  waive: act(waiveMilestone),
  book: act(bookMilestone),
  confirm: act(confirmImported),
  recordFinding: act(recordFinding),
  addOwn: act(addOwnMilestone),
  /** Exactly what would be signed; nothing is written. */
  signingSheet: (place: Place) => ({
    mutationFn: (body: CallInput<typeof readSigningSheet>['body']) =>
      call(readSigningSheet, { params: { ...place }, body }),
  }),
};

/** Fetches again whenever the live view says that something on the board changed. Answers how to stop. */
export const followChanges = (client: QueryClient, childId: string): (() => void) => {
  if (typeof EventSource === 'undefined') return () => undefined;
  const stream = new EventSource(`${apiPrefix}/board/stream`);
  stream.addEventListener('board', () => {
    void client.invalidateQueries({ queryKey: pathwayQueries.ofChild(childId).queryKey, exact: true });
  });
  return () => stream.close();
};
