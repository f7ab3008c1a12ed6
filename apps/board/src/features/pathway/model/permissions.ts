/**
 * What the person at the screen may do with a milestone, and when not, why not. The rules are those of the permission
 * table and of sign-off; the API asks the same.
 */
import {
  abilityFor,
  canChild,
  canMilestone,
  type MilestoneSubject,
  type WeftwayAbility,
} from '@weftway/abilities/ability-for';
import type { Action } from '@weftway/abilities/permission-table';
import type { Pathway } from '@weftway/contract/pathway';
import type { Member } from '@weftway/contract/member';
import type { Me } from '@weftway/contract/session';
import { disciplineNames } from '@weftway/team/disciplines';
import { signingWords } from '../../../words/signing.ts';
import type { MilestoneView, PartView } from './milestone-view.ts';

export interface Viewer {
  readonly me: Me;
  readonly ability: WeftwayAbility;
  readonly pathway: Pathway;
}

/** `null`: allowed. Otherwise the reason, as it stands beside the button. */
export type Refusal = string | null;

export const viewerOf = (me: Me, pathway: Pathway): Viewer => ({ me, ability: abilityFor(me), pathway });

const subjectOf = (viewer: Viewer, view: MilestoneView, part: PartView): MilestoneSubject => ({
  mayClaim: view.rule.mayClaim,
  maySign: part.disciplines,
  ownerId: part.ownerId,
  leadClinicianId: viewer.pathway.child.fields.leadClinicianId,
  trainees: viewer.pathway.trainees,
});

/** "surgeon or jaw surgeon" */
export const signersInWords = (part: Pick<PartView, 'disciplines'>): string =>
  part.disciplines
    .map((one) => (one === 'lead-clinician' ? 'the lead clinician' : disciplineNames[one].toLowerCase()))
    .join(' or ');

/** "a cleft surgeon or an orthodontist" */
const signersWithArticle = (part: Pick<PartView, 'disciplines'>): string =>
  part.disciplines
    .map((one) => (one === 'lead-clinician' ? signingWords.waive.lead : signingWords.why.one(disciplineNames[one])))
    .join(' or ');

const isAllowed = (viewer: Viewer, action: Action, view: MilestoneView, part: PartView): boolean =>
  canMilestone(viewer.ability, action, subjectOf(viewer, view, part));

const stateRefusal = (view: MilestoneView): Refusal => {
  if (view.planned.state === 'transferred') return signingWords.why.transferred;
  if (view.planned.state === 'waived') return signingWords.why.waived;
  return view.planned.state === 'signed' ? signingWords.why.signed : null;
};

/** For acts that any clinician of one of the parts may do. */
const forSomePart = (viewer: Viewer, action: Action, view: MilestoneView): Refusal => {
  const state = stateRefusal(view);
  if (state !== null) return state;
  const may = view.parts.some((part) => isAllowed(viewer, action, view, part));
  return may ? null : signingWords.why.otherDiscipline([...new Set(view.parts.map(signersWithArticle))].join(' and '));
};

export interface PartPermissions {
  readonly claim: Refusal;
  readonly release: Refusal;
  readonly handOver: Refusal;
  readonly draft: Refusal;
  readonly sign: Refusal;
}

export const partPermissions = (viewer: Viewer, view: MilestoneView, part: PartView): PartPermissions => {
  const { why } = signingWords;
  const isSigned = view.planned.state === 'partly-signed' && part.signature !== null;
  const state = stateRefusal(view) ?? (isSigned ? why.partSigned(part.signature?.signerName ?? '') : null);
  const allow = (action: Action, otherwise: string): Refusal =>
    state ?? (isAllowed(viewer, action, view, part) ? null : otherwise);
  const isMine = part.ownerId === viewer.me.id;
  const signers = signersWithArticle(part);
  const mayHandOver = isMine || isAllowed(viewer, 'hand-over', view, part);
  return {
    claim:
      part.ownerId === null
        ? allow('claim', why.otherClaims(signers))
        : (state ?? (isMine ? why.isYours : why.heldBy(part.ownerName ?? ''))),
    release: isMine ? state : why.notYours,
    handOver: state ?? (mayHandOver ? null : why.notYours),
    draft: allow('draft', why.otherDiscipline(signers)),
    sign: viewer.me.standing === 'trainee' ? (state ?? why.trainee) : allow('sign', why.otherDiscipline(signers)),
  };
};

export interface MilestonePermissions {
  readonly hold: Refusal;
  readonly waive: Refusal;
  readonly book: Refusal;
  readonly confirm: Refusal;
  readonly amend: (part: PartView) => boolean;
}

export const milestonePermissions = (viewer: Viewer, view: MilestoneView): MilestonePermissions => ({
  hold: forSomePart(viewer, 'hold', view),
  waive: forSomePart(viewer, 'waive', view),
  book: forSomePart(viewer, 'book', view),
  confirm: view.parts.some((part) => isAllowed(viewer, 'confirm', view, part))
    ? null
    : signingWords.why.surgeonConfirms,
  amend: (part) => part.signature !== null && isAllowed(viewer, 'amend', view, part),
});

export const childPermissions = (viewer: Viewer) => {
  const child = { trainees: viewer.pathway.trainees };
  return {
    recordFinding: canChild(viewer.ability, 'record-finding', child),
    addMilestone: canChild(viewer.ability, 'add-milestone', child),
    edit: canChild(viewer.ability, 'edit', child),
  };
};

/** Colleagues who may hold a part: active, and allowed to claim it. */
export const mayHold = (
  viewer: Viewer,
  view: MilestoneView,
  part: PartView,
  members: readonly Member[],
): readonly Member[] =>
  members.filter((member) => {
    if (member.status !== 'active' || member.id === part.ownerId) return false;
    const ability = abilityFor({ id: member.id, standing: member.standing, disciplines: member.disciplines });
    return canMilestone(ability, 'claim', { ...subjectOf(viewer, view, part), ownerId: null });
  });
