/**
 * The board of the whole caseload. It is fetched once; after that only what changed since is asked for, whenever the
 * live view says so, or every five seconds where the live view cannot be reached.
 */
import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { readBoard, readBoardChanges } from '@weftway/contract/board';
import { apiPrefix } from '@weftway/contract/operation';
import { bookMilestone, claimMilestone, handOverMilestone, releaseMilestone } from '@weftway/contract/pathway';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { call } from '../api/api-client.ts';
import {
  boardModelOf,
  heldBy,
  withChanges,
  withRow,
  withoutFresh,
  type BoardModel,
  type BoardRow,
} from './board-model.ts';
import { myWorkQueries } from './my-work-queries.ts';
import { pathwayQueries } from './pathway-queries.ts';

const readWhole = async (signal: AbortSignal, isBackground: boolean): Promise<BoardModel> =>
  boardModelOf(await call(readBoard, { signal, isBackground }));

const readSince = async (known: BoardModel, signal: AbortSignal): Promise<BoardModel> => {
  const changes = await call(readBoardChanges, { query: { since: known.version }, signal, isBackground: true });
  return changes.isWhole || changes.team !== known.team ? readWhole(signal, true) : withChanges(known, changes);
};

const wholeKey = ['board'] as const;

export const boardQueries = {
  whole: () =>
    queryOptions({
      queryKey: wholeKey,
      queryFn: ({ client, signal }): Promise<BoardModel> => {
        const known = client.getQueryData<BoardModel>(wholeKey);
        return known === undefined ? readWhole(signal, false) : readSince(known, signal);
      },
      // Merging already keeps what stayed the same; comparing thousands of rows would only cost time.
      structuralSharing: false,
      staleTime: 5_000,
    }),
};

const change = (client: QueryClient, update: (model: BoardModel) => BoardModel): void => {
  client.setQueryData<BoardModel>(wholeKey, (model) => (model === undefined ? undefined : update(model)));
};

export interface HoldingChange {
  /** The row as it stood when the person acted. */
  readonly row: BoardRow;
  readonly part: string;
}

/** Shows the act at once; when it was refused the row goes back, and what others did meanwhile is fetched. */
const optimistic = <Input extends HoldingChange>(client: QueryClient, ownerAfter: (input: Input) => string | null) => ({
  onMutate: async (input: Input): Promise<{ readonly shown: BoardRow }> => {
    await client.cancelQueries({ queryKey: wholeKey });
    const shown = heldBy(input.row, input.part, ownerAfter(input));
    change(client, (model) => withRow(model, shown));
    return { shown };
  },
  onError: (_error: unknown, input: Input, context: { readonly shown: BoardRow } | undefined) => {
    change(client, (model) => (model.rows.includes(context?.shown ?? input.row) ? withRow(model, input.row) : model));
  },
  onSettled: (_answer: unknown, _error: unknown, input: Input) => {
    void client.invalidateQueries({ queryKey: wholeKey });
    void client.invalidateQueries({ queryKey: myWorkQueries.all });
    void client.invalidateQueries({ queryKey: pathwayQueries.ofChild(input.row.child.id).queryKey });
  },
});

const placeOf = ({ row }: HoldingChange) => ({ childId: row.child.id, milestone: row.milestone.key });

export const boardMutations = {
  claim: (client: QueryClient, meId: string) => ({
    mutationFn: (input: HoldingChange) => call(claimMilestone, { params: placeOf(input), body: { part: input.part } }),
    ...optimistic<HoldingChange>(client, () => meId),
  }),
  release: (client: QueryClient) => ({
    mutationFn: (input: HoldingChange & { readonly reason: string }) =>
      call(releaseMilestone, { params: placeOf(input), body: { part: input.part, reason: input.reason } }),
    ...optimistic<HoldingChange & { readonly reason: string }>(client, () => null),
  }),
  handOver: (client: QueryClient) => ({
    mutationFn: (input: HoldingChange & { readonly from: string | null; readonly to: string }) =>
      call(handOverMilestone, { params: placeOf(input), body: { part: input.part, from: input.from, to: input.to } }),
    ...optimistic<HoldingChange & { readonly from: string | null; readonly to: string }>(client, (input) => input.to),
  }),
  book: (client: QueryClient) => ({
    mutationFn: (input: { readonly row: BoardRow; readonly on: PlainDate }) =>
      call(bookMilestone, { params: placeOf({ row: input.row, part: '' }), body: { on: input.on, reason: '' } }),
    onSettled: () => void client.invalidateQueries({ queryKey: wholeKey }),
  }),
};

const pollMs = 5_000;
const freshMs = 5_000;

/** Keeps the board up to date while a screen shows it. Answers how to stop. */
export const followBoard = (client: QueryClient, onLive: (isLive: boolean) => void): (() => void) => {
  const ask = () => void client.invalidateQueries({ queryKey: wholeKey });
  const poll = setInterval(() => {
    if (stream?.readyState !== 1) ask();
  }, pollMs);
  const stream = typeof EventSource === 'undefined' ? null : new EventSource(`${apiPrefix}/board/stream`);
  stream?.addEventListener('open', () => {
    onLive(true);
    ask();
  });
  stream?.addEventListener('error', () => onLive(false));
  stream?.addEventListener('board', (event: MessageEvent<string>) => {
    const known = client.getQueryData<BoardModel>(wholeKey);
    if (known === undefined || known.version < Number(event.data)) ask();
  });
  let wearOff: ReturnType<typeof setTimeout> | undefined;
  let lastFresh: ReadonlySet<string> | undefined;
  const stopWatching = client.getQueryCache().subscribe(({ query }) => {
    const fresh = query.queryKey[0] === wholeKey[0] ? client.getQueryData<BoardModel>(wholeKey)?.fresh : undefined;
    if (fresh === undefined || fresh === lastFresh) return;
    lastFresh = fresh;
    clearTimeout(wearOff);
    if (fresh.size > 0) wearOff = setTimeout(() => change(client, withoutFresh), freshMs);
  });
  return () => {
    clearInterval(poll);
    clearTimeout(wearOff);
    stopWatching();
    stream?.close();
  };
};
