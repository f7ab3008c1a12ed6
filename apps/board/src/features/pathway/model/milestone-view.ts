/** Everything the screen says about one milestone, in one value: its plan, its rule, who holds and who signed. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Draft, Signature } from '@weftway/contract/pathway';
import type { PlannedMilestone } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule, Signer } from '@weftway/pathway/protocol';
import type { ChildPlan } from './child-plan.ts';

export interface PartView {
  readonly part: string;
  readonly label: string;
  readonly meaning: string;
  readonly disciplines: readonly Signer[];
  readonly ownerId: string | null;
  readonly ownerName: string | null;
  readonly draft: Draft | null;
  readonly draftByName: string | null;
  /** The signature that stands: the last amendment, else the first entry. */
  readonly signature: Signature | null;
  /** The entries that it amends, the latest first; they stay readable. */
  readonly earlier: readonly Signature[];
}

export interface MilestoneView {
  readonly key: string;
  readonly planned: PlannedMilestone;
  readonly rule: MilestoneRule;
  readonly title: string;
  readonly shortTitle: string;
  readonly parts: readonly PartView[];
  /** Nobody holds a part that is still to be signed. */
  readonly unowned: boolean;
  /** Names of those who hold what is still to be signed; null: no one. */
  readonly ownerNames: string | null;
  /** The day it was done, or decided not to be. */
  readonly doneOn: PlainDate | null;
  readonly isFinished: boolean;
}

export interface ChildViews {
  readonly all: readonly MilestoneView[];
  readonly byKey: ReadonlyMap<string, MilestoneView>;
}

const sideLetters: Readonly<Record<string, string>> = { R: 'R', L: 'L' };

/** Whether a recorded fact is about this row: the same key, or the plain id where the row is the only one. */
export const isAbout = (factKey: string, planned: Pick<PlannedMilestone, 'key' | 'id'>): boolean =>
  factKey === planned.key || factKey === planned.id;

const isDone = (planned: PlannedMilestone): boolean => planned.state === 'signed' || planned.state === 'waived';

const lastOf = <T>(items: readonly T[]): T | undefined => items[items.length - 1];

const doneOn = (of: ChildPlan, planned: PlannedMilestone): PlainDate | null => {
  const { facts } = of.pathway;
  if (planned.state === 'waived') {
    const waiver = lastOf(facts.waivers.filter((one) => isAbout(one.milestone, planned)));
    return waiver?.on ?? planned.window?.target ?? null;
  }
  if (planned.state !== 'signed' && planned.state !== 'partly-signed') return null;
  const parts = planned.state === 'partly-signed' ? facts.parts : [];
  const days = [...facts.completions, ...parts].filter((one) => isAbout(one.milestone, planned)).map((one) => one.on);
  return lastOf(days.toSorted()) ?? null;
};

/** Signatures of the occurrence on screen: of the awaited one, or of the last when all is done. */
const signaturesOf = (of: ChildPlan, planned: PlannedMilestone, part: string): readonly Signature[] => {
  const all = of.pathway.signatures.filter((one) => isAbout(one.milestone, planned) && one.part === part);
  const ofThis = all.filter((one) => one.occurrence === planned.occurrence);
  if (ofThis.length > 0) return ofThis;
  const last = lastOf(all)?.occurrence;
  return planned.state === 'signed' ? all.filter((one) => one.occurrence === last) : [];
};

const partViews = (
  of: ChildPlan,
  planned: PlannedMilestone,
  rule: MilestoneRule,
  nameOf: (id: string) => string,
): PartView[] =>
  rule.signatures.map((part) => {
    const claim = of.pathway.claims.find((one) => isAbout(one.milestone, planned) && one.part === part.part);
    const draft = of.pathway.drafts.find((one) => isAbout(one.milestone, planned) && one.part === part.part);
    const signed = signaturesOf(of, planned, part.part);
    return {
      part: part.part,
      label: part.label,
      meaning: part.meaning,
      disciplines: part.disciplines,
      ownerId: claim?.memberId ?? null,
      ownerName: claim === undefined ? null : nameOf(claim.memberId),
      draft: draft ?? null,
      draftByName: draft === undefined ? null : nameOf(draft.byId),
      signature: lastOf(signed) ?? null,
      earlier: signed.slice(0, -1).toReversed(),
    };
  });

const shortTitleOf = (planned: PlannedMilestone, rule: MilestoneRule, of: ChildPlan): string => {
  const side = planned.side === null ? '' : (sideLetters[planned.side] ?? '');
  if (side !== '') return `${rule.shortTitle} ${side}`;
  const operation = planned.forOperation === null ? null : of.ruleOf(planned.forOperation);
  return operation ? `${rule.shortTitle}: ${operation.shortTitle.toLowerCase()}` : rule.shortTitle;
};

const viewOf = (
  of: ChildPlan,
  planned: PlannedMilestone,
  rule: MilestoneRule,
  nameOf: (id: string) => string,
): MilestoneView => {
  const parts = partViews(of, planned, rule, nameOf);
  const isFinished = isDone(planned) || planned.state === 'transferred';
  const open = parts.filter((part) => part.signature === null || planned.state !== 'partly-signed');
  const owners = [...new Set(open.flatMap((part) => part.ownerName ?? []))];
  const isInReach = planned.state !== 'ahead';
  return {
    key: planned.key,
    planned,
    rule,
    title: of.titleOf(planned.key),
    shortTitle: shortTitleOf(planned, rule, of),
    parts,
    unowned: !isFinished && isInReach && open.some((part) => part.ownerId === null),
    ownerNames: owners.length === 0 ? null : owners.join(', '),
    doneOn: doneOn(of, planned),
    isFinished,
  };
};

export const childViews = (of: ChildPlan, nameOf: (id: string) => string): ChildViews => {
  const all = of.plan.milestones.flatMap((planned) => {
    const rule = of.ruleOf(planned.key);
    return rule === undefined ? [] : [viewOf(of, planned, rule, nameOf)];
  });
  return { all, byKey: new Map(all.map((view) => [view.key, view])) };
};

/** A view by a key as other rows name it: `SURG-03`, or `ORTH-04` for any side of it. */
export const viewNamed = (views: ChildViews, key: string, side: string | null = null): MilestoneView | undefined =>
  views.byKey.get(key) ??
  (side === null ? undefined : views.byKey.get(`${key}:${side}`)) ??
  views.all.find((view) => view.planned.id === key);
