/**
 * Whether one signature of a milestone may be given. Signing is refused with every reason at once, each from a closed
 * list. A gate that is not met cannot be signed past. A check can: what has happened must be recordable, so the signer
 * gives a reason, and for sleep screen, neck vessels and speech before jaw surgery a second clinician's name.
 */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Wait } from './pathway-plan.ts';
import type { EvidenceField, MilestoneRule, Signer } from './protocol.ts';
import { fieldsOfPart, isBlank, missingFields, valueFaults } from './sign-off-evidence.ts';
import type { EvidenceValues } from './sign-off-evidence.ts';
import { signersOf, stateFaults, stateRefusals } from './sign-off-person.ts';
import type { Person, PlannedState, Refusal } from './sign-off-person.ts';

export const signingRefusals = [
  ...stateRefusals,
  'unknown-part',
  'trainee-cannot-sign',
  'not-your-discipline',
  'same-person-twice',
  'same-discipline-twice',
  'in-the-future',
  'before-birth',
  'evidence-missing',
  'evidence-impossible',
  'evidence-unlikely',
  'gate-unmet',
  'check-override-reason-needed',
  'second-name-needed',
] as const;
export type SigningRefusalCode = (typeof signingRefusals)[number];

export interface SigningRefusal extends Refusal<SigningRefusalCode> {
  /** Evidence field that is meant. */
  readonly field?: string;
  /** Gate or check that is meant, as its key. */
  readonly milestone?: string;
}

/** Why a check, or a field value that needs a second name, was signed past. */
export interface CheckOverride {
  /** Key of the check, or name of the field. */
  readonly check: string;
  readonly reason: string;
  readonly secondName: string | null;
}

export interface Signing {
  readonly rule: MilestoneRule;
  readonly part: string;
  readonly signer: Person;
  readonly values: EvidenceValues;
  readonly performedOn: PlainDate;
  readonly today: PlainDate;
  /** Null before birth. */
  readonly birth: PlainDate | null;
  /** Planned as on the day on which it was performed, so that checks are judged on that day. */
  readonly planned: PlannedState;
  /** Signatures already given for this occurrence. */
  readonly given: readonly { readonly part: string; readonly signerId: string; readonly signedAs: Signer }[];
  readonly overrides: readonly CheckOverride[];
}

/** Every reason for which this signature is refused; an empty list when it may be given. */
export function signingFaults(signing: Signing): SigningRefusal[] {
  const fields = fieldsOfPart(signing.rule, signing.part);
  return [
    ...stateFaults(signing.planned, 'record'),
    ...signerFaults(signing),
    ...dayFaults(signing),
    ...recordFaults(fields, signing.values),
    ...waitFaults(signing),
    ...secondNameFaults(signing, fields),
  ];
}

/**
 * In which capacity the signer gives this signature: the first discipline that the part allows and that the other
 * signature has not used. Null when there is none.
 */
export function signsAs(signing: Pick<Signing, 'rule' | 'part' | 'signer' | 'given'>): Signer | null {
  const part = signing.rule.signatures.find((candidate) => candidate.part === signing.part);
  const used = signing.given.map((signature) => signature.signedAs);
  return signersOf(signing.signer, part?.disciplines ?? []).find((signer) => !used.includes(signer)) ?? null;
}

function signerFaults(signing: Signing): SigningRefusal[] {
  const { rule, signer, given } = signing;
  const part = rule.signatures.find((candidate) => candidate.part === signing.part);
  if (!part) return [{ code: 'unknown-part', message: `${rule.title} has no signature called “${signing.part}”.` }];
  if (given.some((signature) => signature.part === signing.part)) {
    return [{ code: 'already-signed', message: `“${part.label}” is signed already.` }];
  }
  if (signer.standing === 'trainee') {
    return [
      {
        code: 'trainee-cannot-sign',
        message: 'A trainee prepares the record; the supervisor reads it again and signs.',
      },
    ];
  }
  if (signer.standing !== 'member' || signersOf(signer, part.disciplines).length === 0) {
    return [{ code: 'not-your-discipline', message: `“${part.label}” is for somebody of another discipline to sign.` }];
  }
  const faults: SigningRefusal[] = [];
  if (given.some((signature) => signature.signerId === signer.id)) {
    faults.push({ code: 'same-person-twice', message: 'The two signatures must come from two people.' });
  }
  if (signsAs(signing) === null) {
    faults.push({ code: 'same-discipline-twice', message: 'The two signatures must come from two disciplines.' });
  }
  return faults;
}

function dayFaults({ rule, performedOn, today, birth }: Signing): SigningRefusal[] {
  if (performedOn > today) return [{ code: 'in-the-future', message: 'The day lies in the future.' }];
  const isBeforeBirth = birth === null || performedOn < birth;
  if (isBeforeBirth && rule.clock.from !== 'prenatal-referral') {
    return [{ code: 'before-birth', message: 'The day lies before the birth of the child.' }];
  }
  return [];
}

function recordFaults(fields: readonly EvidenceField[], values: EvidenceValues): SigningRefusal[] {
  return [
    ...missingFields(fields, values).map((field): SigningRefusal => ({
      code: 'evidence-missing',
      field: field.name,
      message: `${field.label} is empty. Fill it in or say why it is empty.`,
    })),
    ...valueFaults(fields, values).map(({ field, fault }): SigningRefusal => ({
      code: fault.kind === 'impossible' ? 'evidence-impossible' : 'evidence-unlikely',
      field: field.name,
      message: fault.message,
    })),
  ];
}

/** Checks stand before an operation, so they are asked of whoever performs it, not of who reviewed the plan. */
function asksForChecks({ rule, part }: Signing): boolean {
  if (!rule.isOperation) return true;
  return rule.signatures.find((signature) => signature.part === part)?.meaning === 'performed';
}

function waitFaults(signing: Signing): SigningRefusal[] {
  const unmet = (signing.planned?.waitsFor ?? []).filter((wait) => !wait.isMet);
  const gates = unmet.filter((wait) => wait.type === 'gate');
  const checks = asksForChecks(signing) ? unmet.filter((wait) => wait.type === 'check') : [];
  return [
    ...gates.map((wait): SigningRefusal => ({
      code: 'gate-unmet',
      milestone: wait.milestone,
      message: `${wait.milestone} must come first (${causeWords[wait.cause]}).`,
    })),
    ...checks.flatMap((wait) => checkFaults(signing, wait)),
  ];
}

const causeWords: Readonly<Record<Wait['cause'], string>> = {
  met: 'done',
  'not-signed': 'not signed',
  'too-soon': 'too soon after it',
  stale: 'too old',
  result: 'its result does not allow it',
  unverified: 'done elsewhere and not yet confirmed',
  waived: 'waived',
  'waived-decide': 'waived, so somebody must decide',
  'not-on-path': 'not on the path',
  'no-event': 'its event has not come',
};

/** Checks that may be signed past, and whether that takes a second clinician's name. */
export function overridableChecks(
  signing: Signing,
): { readonly check: string; readonly cause: string; readonly needsSecondName: boolean }[] {
  if (!asksForChecks(signing)) return [];
  return (signing.planned?.waitsFor ?? [])
    .filter((wait) => wait.type === 'check' && !wait.isMet)
    .map((wait) => ({
      check: wait.milestone,
      cause: causeWords[wait.cause],
      needsSecondName: needsSecondName(signing.rule, wait.milestone),
    }));
}

function needsSecondName(rule: MilestoneRule, key: string): boolean {
  const id = key.split(':')[0];
  return rule.prerequisites.some((need) => need.type === 'check' && need.milestone === id && need.secondName === true);
}

function checkFaults(signing: Signing, wait: Wait): SigningRefusal[] {
  const override = signing.overrides.find((candidate) => candidate.check === wait.milestone);
  const cause = causeWords[wait.cause];
  if (!override || isBlank(override.reason)) {
    const message = `${wait.milestone} is not in order (${cause}). Say why it was done without it.`;
    return [{ code: 'check-override-reason-needed', milestone: wait.milestone, message }];
  }
  if (!needsSecondName(signing.rule, wait.milestone) || isSecondName(signing.signer, override.secondName)) return [];
  const message = `${wait.milestone} is not in order (${cause}). A second clinician must stand by this with their name.`;
  return [{ code: 'second-name-needed', milestone: wait.milestone, message }];
}

function secondNameFaults({ signer, values, overrides }: Signing, fields: readonly EvidenceField[]): SigningRefusal[] {
  return fields.flatMap((field): SigningRefusal[] => {
    const value = values[field.name]?.value;
    if (value === undefined || value === null || field.secondNameFor?.includes(value) !== true) return [];
    const override = overrides.find((candidate) => candidate.check === field.name);
    if (override && isSecondName(signer, override.secondName)) return [];
    const message = `${field.label}: ${value}. A second clinician must stand by this with their name.`;
    return [{ code: 'second-name-needed', field: field.name, message }];
  });
}

const isSecondName = (signer: Person, name: string | null): boolean =>
  name !== null && !isBlank(name) && name.trim().toLowerCase() !== signer.name.trim().toLowerCase();
