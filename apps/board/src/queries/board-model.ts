/** The board as the screens read it: rows of plain words, in the order in which they are drawn, and who is on the team. */
import { boardMarks, nobody, partSigned } from '@weftway/contract/board';
import type { Board, BoardChanges, BoardChild, BoardMember, BoardMilestone } from '@weftway/contract/board';
import { milestoneStates } from '@weftway/pathway/milestone-state';
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { disciplines } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import { lanes } from '@weftway/team/lanes';
import type { Lane } from '@weftway/team/lanes';
import { standings } from '@weftway/team/standings';
import type { Standing } from '@weftway/team/standings';

export interface BoardColleague {
  readonly id: string;
  readonly name: string;
  readonly initials: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
  readonly isActive: boolean;
}

export interface BoardPerson {
  readonly id: string;
  readonly familyName: string;
  readonly firstName: string;
  /** "Siddiqui, H" */
  readonly shortName: string;
  readonly searchText: string;
  readonly site: string;
  /** Days since 1970-01-01; null while expected. */
  readonly birthDay: number | null;
  readonly leadId: string | null;
  readonly traineeIds: readonly string[];
}

export interface PartRule {
  readonly name: string;
  readonly label: string;
  readonly mayClaim: readonly string[];
  readonly maySign: readonly string[];
}

export interface MilestoneHead {
  readonly key: string;
  readonly id: string;
  readonly title: string;
  readonly lane: Lane;
  readonly parts: readonly PartRule[];
}

/** Who holds a part: a member, `null` for nobody, `signed` when it is done. */
export type Holder = string | null | 'signed';

export interface BoardRow {
  readonly id: string;
  readonly child: BoardPerson;
  readonly milestone: MilestoneHead;
  readonly state: MilestoneState;
  readonly isDue: boolean;
  readonly isSqueezed: boolean;
  /** Days since 1970-01-01; null without a window. */
  readonly opens: number | null;
  readonly closes: number | null;
  /** In the order of the parts. */
  readonly holders: readonly Holder[];
  readonly isUnowned: boolean;
}

export interface BoardModel {
  readonly version: number;
  readonly day: number;
  readonly team: string;
  readonly colleagues: ReadonlyMap<string, BoardColleague>;
  /** By state, then earliest close, then surname. */
  readonly rows: readonly BoardRow[];
  /** Rows that somebody else has just changed. */
  readonly fresh: ReadonlySet<string>;
}

export const rowIdOf = (childId: string, milestone: string): string => `${childId} ${milestone}`;

const drawnFirst: readonly MilestoneState[] = ['late', 'closing', 'open', 'waiting', 'held', 'partly-signed', 'ahead'];
const placeInBin = new Map<MilestoneState, number>(drawnFirst.map((state, place) => [state, place]));
const collator = new Intl.Collator('en', { sensitivity: 'base' });
const noWindow = Number.MAX_SAFE_INTEGER;

export const inBoardOrder = (a: BoardRow, b: BoardRow): number =>
  (placeInBin.get(a.state) ?? 9) - (placeInBin.get(b.state) ?? 9) ||
  (a.closes ?? noWindow) - (b.closes ?? noWindow) ||
  (a.child === b.child ? 0 : collator.compare(a.child.familyName, b.child.familyName));

const disciplineAt = (place: number): string => disciplines[place] ?? 'lead-clinician';

const colleagueOf = ([id, name, initials, standing, held, isActive]: BoardMember): BoardColleague => ({
  id,
  name,
  initials,
  standing: standings[standing] ?? 'member',
  disciplines: held.flatMap((place) => disciplines[place] ?? []),
  isActive: isActive === 1,
});

const headOf = ([key, id, title, lane, parts]: BoardMilestone): MilestoneHead => ({
  key,
  id,
  title,
  lane: lanes[lane] ?? 'team',
  parts: parts.map(([name, label, mayClaim, maySign]) => ({
    name,
    label,
    mayClaim: mayClaim.map(disciplineAt),
    maySign: maySign.map(disciplineAt),
  })),
});

/** Lower case without accents, so that "Huaman" finds Huamán. */
export const plainText = (text: string): string =>
  text.normalize('NFD').replace(/\p{M}/gu, '').replace(/ł/gi, 'l').toLowerCase();

const personOf = (child: BoardChild, memberIds: readonly string[]): BoardPerson => {
  const [id, familyName, firstName, site, birthDay, lead, trainees] = child;
  return {
    id,
    familyName,
    firstName,
    shortName: `${familyName}, ${[...firstName][0] ?? ''}`,
    searchText: plainText(`${firstName} ${familyName} ${firstName}`),
    site,
    birthDay: birthDay < 0 ? null : birthDay,
    leadId: memberIds[lead] ?? null,
    traineeIds: trainees.flatMap((place) => memberIds[place] ?? []),
  };
};

interface Lists {
  readonly memberIds: readonly string[];
  readonly heads: readonly MilestoneHead[];
  /** One list of holders for each holder of a single part, shared by all rows. */
  readonly single: Map<number, readonly Holder[]>;
}

const holderAt = (place: number, memberIds: readonly string[]): Holder =>
  place === partSigned ? 'signed' : place === nobody ? null : (memberIds[place] ?? null);

const holdersOf = (owners: number | readonly number[], { memberIds, single }: Lists): readonly Holder[] => {
  if (typeof owners !== 'number') return owners.map((place) => holderAt(place, memberIds));
  const known = single.get(owners) ?? [holderAt(owners, memberIds)];
  single.set(owners, known);
  return known;
};

const addRowsOf = (child: BoardChild, lists: Lists, rows: BoardRow[]): void => {
  const person = personOf(child, lists.memberIds);
  const [, , , , , , , milestones, states, marks, closes, spans, owners] = child;
  for (const [at, place] of milestones.entries()) {
    const milestone = lists.heads[place];
    const close = closes[at] ?? -1;
    const bits = marks[at] ?? 0;
    if (milestone === undefined) continue;
    const holders = holdersOf(owners[at] ?? nobody, lists);
    rows.push({
      id: rowIdOf(person.id, milestone.key),
      child: person,
      milestone,
      state: milestoneStates[states[at] ?? 0] ?? 'ahead',
      isDue: (bits & boardMarks.due) !== 0,
      isSqueezed: (bits & boardMarks.squeezed) !== 0,
      opens: close < 0 ? null : close - (spans[at] ?? 0),
      closes: close < 0 ? null : close,
      holders,
      isUnowned: holders.includes(null),
    });
  }
};

const rowsOf = (board: Board): BoardRow[] => {
  const lists: Lists = {
    memberIds: board.members.map(([id]) => id),
    heads: board.milestones.map(headOf),
    single: new Map(),
  };
  const rows: BoardRow[] = [];
  for (const child of board.children) addRowsOf(child, lists, rows);
  return rows;
};

const none: ReadonlySet<string> = new Set();

export const boardModelOf = (board: Board): BoardModel => ({
  version: board.version,
  day: board.day,
  team: board.team,
  colleagues: new Map(board.members.map((member) => [member[0], colleagueOf(member)])),
  rows: rowsOf(board).sort(inBoardOrder),
  fresh: none,
});

const isSameRow = (a: BoardRow, b: BoardRow): boolean =>
  a.state === b.state &&
  a.closes === b.closes &&
  a.isDue === b.isDue &&
  a.holders.length === b.holders.length &&
  a.holders.every((holder, at) => holder === b.holders[at]);

/** The board after these changes; what looks different is marked as fresh. */
export const withChanges = (model: BoardModel, changes: BoardChanges): BoardModel => {
  const head = { version: changes.version, day: changes.day };
  if (changes.children.length === 0)
    return changes.version === model.version && changes.day === model.day ? model : { ...model, ...head };
  const changed = new Set(changes.children.map(([id]) => id));
  const before = new Map(model.rows.filter((row) => changed.has(row.child.id)).map((row) => [row.id, row]));
  const arrived = rowsOf(changes);
  const fresh = arrived.filter((row) => {
    const known = before.get(row.id);
    return known === undefined || !isSameRow(known, row);
  });
  const colleagues = new Map([
    ...model.colleagues,
    ...changes.members.map((member) => [member[0], colleagueOf(member)] as const),
  ]);
  const rows = [...model.rows.filter((row) => !changed.has(row.child.id)), ...arrived].sort(inBoardOrder);
  return {
    ...model,
    ...head,
    colleagues,
    rows,
    fresh: fresh.length === 0 ? model.fresh : new Set(fresh.map((row) => row.id)),
  };
};

/** The same board with one row replaced. */
export const withRow = (model: BoardModel, row: BoardRow): BoardModel => ({
  ...model,
  rows: model.rows.map((known) => (known.id === row.id ? row : known)),
});

export const withoutFresh = (model: BoardModel): BoardModel =>
  model.fresh.size === 0 ? model : { ...model, fresh: none };

/** The row as it looks once somebody holds one of its parts, or nobody does. */
export const heldBy = (row: BoardRow, part: string, memberId: string | null): BoardRow => {
  const holders = row.holders.map((holder, at) => (row.milestone.parts[at]?.name === part ? memberId : holder));
  return { ...row, holders, isUnowned: holders.includes(null) };
};
