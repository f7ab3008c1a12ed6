/**
 * What a signature would say, exactly: the text that is signed, its digest, in which capacity, and why not yet.
 * The digest covers the canonical JSON of one part of one occurrence, so that the other part does not shake it.
 */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence } from '@weftway/contract/pathway';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { EvidenceField, Signer } from '@weftway/pathway/protocol';
import { signingFaults, signsAs } from '@weftway/pathway/sign-off';
import type { CheckOverride, Signing, SigningRefusal } from '@weftway/pathway/sign-off';
import { fieldsOfPart } from '@weftway/pathway/sign-off-evidence';
import { disciplineNames } from '@weftway/team/disciplines';
import type { Actor } from '../http/endpoint.ts';
import { canonicalText, digestOf } from '../trail/trail-chain.ts';
import { occurrenceToSign, personOf, plannedOf } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import type { PathwayRecord, SignatureRow } from './pathway-store.ts';
import { halfSigned } from './signed-entries.ts';

export interface ToSign {
  readonly part: string;
  readonly performedOn: PlainDate;
  readonly values: Evidence;
  readonly overrides: readonly CheckOverride[];
}

export interface PreparedSigning {
  readonly signing: Signing;
  readonly faults: readonly SigningRefusal[];
  readonly signedAs: Signer | null;
  readonly occurrence: number;
  readonly meaning: string;
  /** Canonical JSON of what is signed. */
  readonly text: string;
  readonly digest: string;
}

/** The role that is printed beside a signature. */
export const roleOfSigner = (signer: Signer, actor: Pick<Actor, 'disciplines'>): string =>
  signer === 'lead-clinician'
    ? `Lead clinician, ${actor.disciplines.map((one) => disciplineNames[one]).join(', ')}`
    : disciplineNames[signer];

/** In which capacity a stored signature was given. */
const signedAsOf = (row: SignatureRow, allowed: readonly Signer[]): Signer | null =>
  allowed.find((signer) =>
    signer === 'lead-clinician'
      ? row.signer_role.startsWith('Lead clinician')
      : row.signer_role === disciplineNames[signer],
  ) ??
  allowed.find((signer) => signer !== 'lead-clinician' && row.signer_role.includes(disciplineNames[signer])) ??
  null;

export const givenOf = (opened: OpenedMilestone, rows: readonly SignatureRow[]): Signing['given'] =>
  rows.flatMap((row) => {
    const allowed = opened.rule.signatures.find((signature) => signature.part === row.part)?.disciplines ?? [];
    const signedAs = signedAsOf(row, allowed) ?? allowed[0];
    return signedAs === undefined ? [] : [{ part: row.part, signerId: row.signer_id, signedAs }];
  });

const identifiersOf = ({ child }: PathwayRecord) => ({
  id: child.id,
  name: `${child.first_name} ${child.family_name}`,
  recordNumber: child.record_number,
  bornOn: child.born_on,
});

/** Canonical JSON of exactly what a signature stands for. */
export const signedTextOf = (
  opened: OpenedMilestone,
  signed: {
    readonly part: string;
    readonly occurrence: number;
    readonly meaning: string;
    readonly performedOn: string;
    readonly values: Evidence;
    readonly amends?: string;
    readonly amendReason?: string;
  },
): string =>
  canonicalText({
    child: identifiersOf(opened.record),
    milestone: opened.key,
    title: opened.rule.title,
    protocolVersion: opened.record.child.protocol_version,
    part: signed.part,
    occurrence: signed.occurrence,
    meaning: signed.meaning,
    performedOn: signed.performedOn,
    evidence: signed.values,
    ...(signed.amends === undefined ? {} : { amends: signed.amends, amendReason: signed.amendReason }),
  });

/** The state of today with what was waited for on the day on which it was done. */
const plannedForSigning = (opened: OpenedMilestone, performedOn: PlainDate, today: PlainDate): Signing['planned'] => {
  const { planned, plan, protocol, facts, key } = opened;
  if (planned === null || performedOn >= today) return planned;
  const then = planPathway(protocol, facts, performedOn, { reasons: false });
  return {
    key,
    state: planned.state,
    isLapsed: planned.isLapsed,
    isRenewable: planned.isRenewable,
    waitsFor: (plannedOf(then, key) ?? plannedOf(plan, key) ?? planned).waitsFor,
  };
};

export const prepareSigning = (
  opened: OpenedMilestone,
  actor: Actor,
  toSign: ToSign,
  today: PlainDate,
): PreparedSigning => {
  const { rule, record, occurrences, key, facts } = opened;
  const signing: Signing = {
    rule,
    part: toSign.part,
    signer: personOf(record, actor),
    values: toSign.values,
    performedOn: toSign.performedOn,
    today,
    birth: facts.birth,
    planned: plannedForSigning(opened, toSign.performedOn, today),
    given: givenOf(opened, halfSigned(occurrences, key)?.standing ?? []),
    overrides: toSign.overrides,
  };
  const meaning = rule.signatures.find((signature) => signature.part === toSign.part)?.meaning ?? '';
  const occurrence = occurrenceToSign(opened);
  const text = signedTextOf(opened, { ...toSign, occurrence, meaning });
  return {
    signing,
    faults: signingFaults(signing),
    signedAs: signsAs(signing),
    occurrence,
    meaning,
    text,
    digest: digestOf(text),
  };
};

const textOf = (field: EvidenceField, value: Evidence[string] | undefined): string => {
  if (value?.value === null || value?.value === undefined || value.value === '')
    return value?.emptyBecause === undefined || value.emptyBecause === '' ? 'Empty' : `Empty: ${value.emptyBecause}`;
  if (field.kind === 'date')
    return /^\d{4}-\d{2}-\d{2}$/.test(value.value) ? formatDate(value.value as PlainDate) : value.value; // shaped like a date
  return field.unit === undefined ? value.value : `${value.value} ${field.unit}`;
};

/** What is signed, field by field, as it is printed. */
export const evidenceLines = (opened: OpenedMilestone, part: string, values: Evidence, hidden: readonly string[]) =>
  fieldsOfPart(opened.rule, part).map((field) => ({
    name: field.name,
    label: field.label,
    text: hidden.includes(field.name) ? 'Kept private' : textOf(field, values[field.name]),
  }));

const verbs: Readonly<Record<string, string>> = {
  performed: 'I did',
  reviewed: 'I have reviewed and agree with',
  recorded: 'I confirm that the record is complete for',
};

/** The sentence that the signer stands by. */
export const sentenceOf = (
  { record, rule, key }: OpenedMilestone,
  prepared: Pick<PreparedSigning, 'meaning' | 'occurrence'>,
  part: string,
  performedOn: PlainDate,
): string => {
  const { name, recordNumber, bornOn } = identifiersOf(record);
  const label =
    rule.signatures.length > 1
      ? `, ${rule.signatures.find((signature) => signature.part === part)?.label ?? part}`
      : '';
  const side = key.endsWith(':R') ? ', right side' : key.endsWith(':L') ? ', left side' : '';
  const born = bornOn === null ? 'not born yet' : `born ${formatDate(bornOn as PlainDate)}`; // stored as a checked date
  return `${verbs[prepared.meaning] ?? 'I sign'} “${rule.title}”${label}${side} for ${name}, ${born}, record ${recordNumber}, on ${formatDate(performedOn)}.`;
};
