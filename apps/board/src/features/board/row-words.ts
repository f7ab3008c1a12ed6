/** A row of the board in words: for its tip, its accessible name and the list. */
import { shortAgeText } from '@weftway/calendar/age';
import { formatDate } from '@weftway/calendar/format-date';
import { fromEpochDay } from '@weftway/calendar/plain-date';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import type { BoardModel, BoardRow, Holder } from '../../queries/board-model.ts';
import { boardWords } from '../../words/board.ts';
import { formatSpan } from '../../words/dates.ts';

export const childName = (row: BoardRow): string => `${row.child.firstName} ${row.child.familyName}`;

export const ageOf = (row: BoardRow, day: number): string =>
  row.child.birthDay === null || row.child.birthDay > day
    ? boardWords.expected
    : shortAgeText(fromEpochDay(row.child.birthDay), fromEpochDay(day));

/** "12 days late", "9 weeks left" */
export const timeOf = (row: BoardRow, day: number): string => {
  if (row.closes === null) return boardWords.noWindow;
  const left = row.closes - day;
  if (left === 0) return boardWords.closesToday;
  return left < 0 ? boardWords.late(formatSpan(left)) : boardWords.left(formatSpan(left));
};

export const windowOf = (row: BoardRow): string =>
  row.closes === null || row.opens === null
    ? boardWords.noWindow
    : boardWords.window(formatDate(fromEpochDay(row.opens)), formatDate(fromEpochDay(row.closes)));

const whoIs = (holder: Holder, model: BoardModel): string =>
  holder === null || holder === 'signed' ? boardWords.noOne : (model.colleagues.get(holder)?.name ?? boardWords.noOne);

/** Who holds each part that is not signed yet. */
export const holdersText = (row: BoardRow, model: BoardModel): string => {
  const open = row.holders.flatMap((holder, at) =>
    holder === 'signed' ? [] : [{ who: whoIs(holder, model), label: row.milestone.parts[at]?.label ?? '' }],
  );
  return row.milestone.parts.length === 1
    ? (open[0]?.who ?? boardWords.noOne)
    : open.map(({ label, who }) => boardWords.part(label, who)).join('; ');
};

/** Initials of the first holder, or null where somebody is still missing. */
export const initialsOf = (row: BoardRow, model: BoardModel): string | null => {
  if (row.isUnowned) return null;
  const holder = row.holders.find((one) => one !== 'signed' && one !== null);
  return holder === undefined || holder === null ? null : (model.colleagues.get(holder)?.initials ?? null);
};

/** Name, state, window, owner: the order in which it is read out. */
export const rowName = (row: BoardRow, model: BoardModel): string =>
  [
    childName(row),
    row.milestone.title,
    milestoneStateNames[row.state].toLowerCase(),
    timeOf(row, model.day),
    row.isUnowned ? boardWords.noOne : holdersText(row, model),
  ].join(', ');
