/** What the person at the board may do with a row, and when not, why not. The API asks the same table. */
import { abilityFor, canMilestone, type MilestoneSubject, type WeftwayAbility } from '@weftway/abilities/ability-for';
import type { Me } from '@weftway/contract/session';
import { disciplineNames, disciplines } from '@weftway/team/disciplines';
import type { BoardColleague, BoardModel, BoardRow, Holder, PartRule } from '../../queries/board-model.ts';
import { boardWords } from '../../words/board.ts';

export interface BoardViewer {
  readonly me: Me;
  readonly ability: WeftwayAbility;
}

export const boardViewerOf = (me: Me): BoardViewer => ({ me, ability: abilityFor(me) });

export type Allowed<Value> =
  { readonly isAllowed: true; readonly value: Value } | { readonly isAllowed: false; readonly why: string };

const allow = <Value>(value: Value): Allowed<Value> => ({ isAllowed: true, value });
const refuse = (why: string): { readonly isAllowed: false; readonly why: string } => ({ isAllowed: false, why });

interface HeldPart {
  readonly part: PartRule;
  readonly holder: Holder;
}

const partsOf = (row: BoardRow): readonly HeldPart[] =>
  row.milestone.parts.map((part, at) => ({ part, holder: row.holders[at] ?? null }));

const subjectOf = (row: BoardRow, part: PartRule, ownerId: string | null): MilestoneSubject => ({
  mayClaim: part.mayClaim,
  maySign: part.maySign,
  ownerId,
  leadClinicianId: row.child.leadId,
  trainees: row.child.traineeIds,
});

const namesOf = (signers: readonly string[]): string =>
  signers
    .map((signer) => disciplines.find((one) => one === signer))
    .map((one) => (one === undefined ? boardWords.leadClinician : boardWords.a(disciplineNames[one].toLowerCase())))
    .join(boardWords.or);

const nameIn = (model: BoardModel, id: string): string => model.colleagues.get(id)?.name ?? '';

/** The part that the viewer would take on. */
export const claimOf = (viewer: BoardViewer, model: BoardModel, row: BoardRow): Allowed<PartRule> => {
  const parts = partsOf(row);
  const free = parts.filter(({ holder }) => holder === null);
  const mine = free.find(({ part }) => canMilestone(viewer.ability, 'claim', subjectOf(row, part, null)));
  if (mine !== undefined) return allow(mine.part);
  if (parts.some(({ holder }) => holder === viewer.me.id)) return refuse(boardWords.why.yours);
  const [firstFree] = free;
  if (firstFree !== undefined) return refuse(boardWords.why.other(namesOf(firstFree.part.mayClaim)));
  const holder = parts.find((part) => part.holder !== 'signed')?.holder ?? '';
  return refuse(boardWords.why.held(nameIn(model, holder)));
};

export interface Handing {
  readonly part: PartRule;
  readonly from: string | null;
}

/** The part that the viewer could give to somebody: their own first. */
export const handingOf = (viewer: BoardViewer, model: BoardModel, row: BoardRow): Allowed<Handing> => {
  const open = partsOf(row).flatMap(({ part, holder }) => (holder === 'signed' ? [] : [{ part, from: holder }]));
  const may = open.filter(({ part, from }) => canMilestone(viewer.ability, 'hand-over', subjectOf(row, part, from)));
  const chosen = may.find(({ from }) => from === viewer.me.id) ?? may.find(({ from }) => from === null) ?? may[0];
  if (chosen !== undefined) return allow(chosen);
  const holder = open.find(({ from }) => from !== null)?.from;
  return refuse(
    holder === undefined || holder === null
      ? boardWords.why.nobodyToHand
      : boardWords.why.notYoursToHand(nameIn(model, holder)),
  );
};

/** Whether the viewer could take a milestone back from the colleague it went to. */
export const mayTakeBack = (viewer: BoardViewer, row: BoardRow, part: PartRule, from: string): boolean =>
  canMilestone(viewer.ability, 'hand-over', subjectOf(row, part, from));

export const releaseOf = (viewer: BoardViewer, row: BoardRow): Allowed<PartRule> => {
  const mine = partsOf(row).find(
    ({ part, holder }) =>
      holder === viewer.me.id && canMilestone(viewer.ability, 'release', subjectOf(row, part, viewer.me.id)),
  );
  return mine === undefined ? refuse(boardWords.why.notHeld) : allow(mine.part);
};

/** A date is for the milestone as a whole. */
export const bookingOf = (viewer: BoardViewer, row: BoardRow): Allowed<null> => {
  const parts = row.milestone.parts;
  const whole = {
    mayClaim: parts.flatMap((part) => part.mayClaim),
    maySign: parts.flatMap((part) => part.maySign),
    ownerId: null,
    leadClinicianId: row.child.leadId,
    trainees: row.child.traineeIds,
  };
  return canMilestone(viewer.ability, 'book', whole) ? allow(null) : refuse(boardWords.why.book);
};

/** Colleagues who may hold the part, by name. */
export const candidatesOf = (model: BoardModel, row: BoardRow, { part, from }: Handing): readonly BoardColleague[] =>
  [...model.colleagues.values()]
    .filter(
      (colleague) =>
        colleague.isActive &&
        colleague.id !== from &&
        canMilestone(abilityFor(colleague), 'claim', subjectOf(row, part, null)),
    )
    .sort((a, b) => a.name.localeCompare(b.name));
