/** What can be done from the board: each act shows at once, can be undone, and says why when it could not be. */
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { ApiProblem, isProblem } from '../../api/api-client.ts';
import { heldBy, type BoardModel, type BoardRow, type PartRule } from '../../queries/board-model.ts';
import { boardMutations } from '../../queries/board-queries.ts';
import { showToast } from '../../ui/overlays/toasts.ts';
import { boardWords } from '../../words/board.ts';
import { kitWords } from '../../words/kit.ts';
import { formatSpan } from '../../words/dates.ts';
import { claimOf, handingOf, mayTakeBack, releaseOf, type BoardViewer } from './row-permissions.ts';
import { childName } from './row-words.ts';

export interface BoardActs {
  readonly claim: (row: BoardRow) => void;
  readonly letGo: (row: BoardRow) => void;
  readonly handOver: (row: BoardRow, to: string) => void;
  readonly book: (row: BoardRow, on: PlainDate) => void;
}

/** "Obed Nkansah took this 4 seconds ago", where somebody else was faster. */
const whyRefused = (error: unknown): string => {
  if (!(error instanceof ApiProblem)) return kitWords.notSaved;
  const { holder, current } = error.problem;
  const since =
    typeof current === 'object' && current !== null && 'since' in current
      ? Date.parse(String(current.since))
      : Number.NaN;
  if (!isProblem(error, 'milestone-already-claimed') || typeof holder !== 'string' || Number.isNaN(since))
    return error.problem.detail ?? error.problem.title;
  return boardWords.took(holder, secondsAgo(Math.max(1, Math.round((Date.now() - since) / 1000))));
};

const secondsAgo = (seconds: number): string => {
  if (seconds < 120) return boardWords.secondsAgo(seconds);
  return seconds < 7200
    ? boardWords.minutesAgo(Math.round(seconds / 60))
    : boardWords.agoSpan(formatSpan(Math.floor(seconds / 86_400)), seconds < 86_400);
};

const tellProblem = (error: unknown): void => showToast({ text: boardWords.refused(whyRefused(error)) });

export function useBoardActs(viewer: BoardViewer, model: BoardModel): BoardActs {
  const client = useQueryClient();
  const claim = useMutation(boardMutations.claim(client, viewer.me.id));
  const release = useMutation(boardMutations.release(client));
  const handOver = useMutation(boardMutations.handOver(client));
  const book = useMutation(boardMutations.book(client));

  const takeBack = (row: BoardRow, part: PartRule) => {
    const held = heldBy(row, part.name, viewer.me.id);
    release.mutate(
      { row: held, part: part.name, reason: boardWords.undoReason },
      {
        onSuccess: () => showToast({ text: boardWords.undone(row.milestone.title, childName(row)) }),
        onError: tellProblem,
      },
    );
  };

  const handBack = (row: BoardRow, part: PartRule, from: string, to: string) =>
    handOver.mutate(
      { row: heldBy(row, part.name, to), part: part.name, from: to, to: from },
      {
        onSuccess: () => showToast({ text: boardWords.undone(row.milestone.title, childName(row)) }),
        onError: tellProblem,
      },
    );

  return {
    claim: (row) => {
      const allowed = claimOf(viewer, model, row);
      if (!allowed.isAllowed) return showToast({ text: boardWords.refused(allowed.why) });
      const part = allowed.value;
      claim.mutate(
        { row, part: part.name },
        {
          onSuccess: () =>
            showToast({
              text: boardWords.claimed(row.milestone.title, childName(row)),
              onUndo: () => takeBack(row, part),
            }),
          onError: tellProblem,
        },
      );
    },
    letGo: (row) => {
      const allowed = releaseOf(viewer, row);
      if (!allowed.isAllowed) return showToast({ text: boardWords.refused(allowed.why) });
      release.mutate(
        { row, part: allowed.value.name, reason: '' },
        {
          onSuccess: () => showToast({ text: boardWords.released(row.milestone.title, childName(row)) }),
          onError: tellProblem,
        },
      );
    },
    handOver: (row, to) => {
      const allowed = handingOf(viewer, model, row);
      if (!allowed.isAllowed) return showToast({ text: boardWords.refused(allowed.why) });
      const { part, from } = allowed.value;
      const name = model.colleagues.get(to)?.name ?? '';
      const canGoBack = from !== null && mayTakeBack(viewer, row, part, to);
      const onUndo = canGoBack ? () => handBack(row, part, from, to) : undefined;
      handOver.mutate(
        { row, part: part.name, from, to },
        {
          onSuccess: () => showToast({ text: boardWords.handed(row.milestone.title, childName(row), name), onUndo }),
          onError: tellProblem,
        },
      );
    },
    book: (row, on) =>
      book.mutate(
        { row, on },
        {
          onSuccess: () => showToast({ text: boardWords.booked(row.milestone.title, childName(row), formatDate(on)) }),
          onError: tellProblem,
        },
      ),
  };
}
