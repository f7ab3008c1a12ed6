/** What the planner reads, made from what is recorded. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import { findingsFromCompletion } from '@weftway/pathway/findings-from-completion';
import type {
  Completion,
  Finding,
  PartCompletion,
  PathwayFacts,
  RootReading,
  Side,
} from '@weftway/pathway/pathway-facts';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import type { PathwayRecord, SignatureRow } from './pathway-store.ts';
import { evidenceOf, plainValues, signedOccurrences } from './signed-entries.ts';
import type { SignedOccurrence } from './signed-entries.ts';
import { ownRulesOf, protocolOf, ruleIdOf, rulesOf } from './whole-protocol.ts';

type Rules = ReadonlyMap<string, MilestoneRule>;

const date = (text: string): PlainDate => text as PlainDate; // stored as a checked date

const completionOf = (one: SignedOccurrence): Completion => {
  const on = one.standing.map((entry) => entry.performed_on).reduce((a, b) => (a > b ? a : b));
  const results: Record<string, string> = {};
  for (const entry of one.standing) Object.assign(results, plainValues(evidenceOf(entry)));
  return { milestone: one.milestone, on: date(on), results };
};

const partsOf = (one: SignedOccurrence): PartCompletion[] =>
  one.standing.map((entry) => ({
    milestone: entry.milestone,
    part: entry.part,
    on: date(entry.performed_on),
    kind: 'signed',
  }));

const importedOf = (record: PathwayRecord): Completion[] =>
  record.imported.map((row) => ({
    milestone: row.milestone,
    on: date(row.performed_on),
    results: JSON.parse(row.results) as Record<string, string>, // written by the import
    isUnverified: row.is_unverified === 1,
    precision: row.date_precision,
  }));

const raisedOfImported = (completions: readonly Completion[], rules: Rules): Finding[] =>
  completions.flatMap((completion) => {
    const rule = rules.get(ruleIdOf(completion.milestone));
    return rule === undefined ? [] : findingsFromCompletion(rule, completion);
  });

const holds = (row: SignatureRow, field: string, oneOf: readonly string[]): boolean =>
  oneOf.includes(evidenceOf(row)[field]?.value ?? '\u0000');

/**
 * Findings that signed values raise. They count from the day on which they were recorded, so that a finding written
 * down late does not make its milestone late at birth; an amendment that takes the value back takes the finding back.
 */
const raisedOfSigned = (occurrences: readonly SignedOccurrence[], rules: Rules): Finding[] =>
  occurrences
    .filter((one) => one.isComplete)
    .flatMap((one) =>
      (rules.get(ruleIdOf(one.milestone))?.raises ?? []).flatMap((raise) => {
        if (!one.standing.some((row) => holds(row, raise.field, raise.oneOf))) return [];
        const first = one.entries.find((row) => holds(row, raise.field, raise.oneOf));
        if (first === undefined) return [];
        return [
          {
            name: raise.finding,
            on: date(first.signed_on > first.performed_on ? first.signed_on : first.performed_on),
          },
        ];
      }),
    );

/**
 * Treatment that runs for months is signed at its end; that it was begun counts from the draft that says so. Only
 * findings named as a start are read from drafts: nothing else counts before it is signed.
 */
const begunInDrafts = (record: PathwayRecord, rules: Rules): Finding[] =>
  record.drafts.flatMap((draft) =>
    (rules.get(ruleIdOf(draft.milestone))?.raises ?? [])
      .filter(
        (raise) =>
          raise.finding.endsWith('_started') && raise.oneOf.includes(evidenceOf(draft)[raise.field]?.value ?? '\u0000'),
      )
      .map((raise) => ({ name: raise.finding, on: date(draft.performed_on ?? draft.at.slice(0, 10)) })),
  );

/** The earliest day of each finding counts. */
const earliest = (findings: readonly Finding[]): Finding[] => {
  const byName = new Map<string, Finding>();
  for (const finding of findings) {
    const known = byName.get(finding.name);
    if (known === undefined || finding.on < known.on) byName.set(finding.name, finding);
  }
  return [...byName.values()];
};

/** The side that a reading belongs to: named by the field (`root_stage_right`), else by the milestone (`ORTH-04:L`). */
const sideOf = (field: string, key: string): Side | null => {
  if (field.endsWith('_right') || key.endsWith(':R')) return 'R';
  return field.endsWith('_left') || key.endsWith(':L') ? 'L' : null;
};

const rootsOf = (completions: readonly Completion[], rules: Rules): RootReading[] =>
  completions.flatMap((completion) =>
    (rules.get(ruleIdOf(completion.milestone))?.evidence ?? [])
      .filter((field) => field.kind === 'root-stage')
      .flatMap((field) => {
        const stage = completion.results?.[field.name];
        const side = sideOf(field.name, completion.milestone);
        return stage === undefined || side === null ? [] : [{ on: completion.on, stage, side }];
      }),
  );

const ownFindings = (record: PathwayRecord): Finding[] =>
  ownRulesOf(record.own).flatMap((rule, index) => {
    const addedOn = record.own[index]?.added_on;
    return rule.clock.from === 'finding' && addedOn !== undefined
      ? [{ name: rule.clock.finding, on: date(addedOn), isLate: false }]
      : [];
  });

const findingsOf = (
  record: PathwayRecord,
  imported: readonly Completion[],
  occurrences: readonly SignedOccurrence[],
  rules: Rules,
): Finding[] => {
  const { child } = record;
  return earliest([
    ...record.findings.map((row) => ({ name: row.name, on: date(row.found_on) })),
    ...raisedOfImported(imported, rules),
    ...raisedOfSigned(occurrences, rules),
    ...begunInDrafts(record, rules),
    ...(child.prenatal_referral_on === null
      ? []
      : [{ name: 'prenatal_referral', on: date(child.prenatal_referral_on) }]),
    ...referralOf(child),
    ...ownFindings(record),
  ]);
};

const flagsOf = (record: PathwayRecord): string[] => {
  const syndromes = JSON.parse(record.child.syndromes) as string[]; // written from the contract's schema
  return [...(JSON.parse(record.child.flags) as string[]), ...(syndromes.length > 0 ? ['syndrome'] : [])]; // likewise
};

const draftedOf = (record: PathwayRecord): PartCompletion[] =>
  record.drafts
    .filter((draft) => draft.is_ready === 1)
    .map((draft) => ({
      milestone: draft.milestone,
      part: draft.part,
      on: date(draft.performed_on ?? draft.at.slice(0, 10)),
      kind: 'drafted',
    }));

/** The day on which the team heard of a born child; of a late arrival, when nobody wrote it down, the day of arrival. */
const referralOf = (child: PathwayRecord['child']): Finding[] => {
  const on = child.referred_on ?? child.team_start_on;
  return on === null ? [] : [{ name: 'birth_referral', on: date(on) }];
};

export const pathwayFactsOf = (record: PathwayRecord, protocol: Protocol): PathwayFacts => {
  const { child } = record;
  const rules = rulesOf(protocolOf(protocol, record.own));
  const occurrences = signedOccurrences(record, rules);
  const imported = importedOf(record);
  const completions = [...imported, ...occurrences.filter((one) => one.isComplete).map(completionOf)];
  return {
    birth: child.born_on === null ? null : date(child.born_on),
    due: child.due_on === null ? null : date(child.due_on),
    isBirthEstimated: child.is_birth_estimated === 1,
    gestation:
      child.gestation_days === null
        ? null
        : { weeks: Math.floor(child.gestation_days / 7), days: child.gestation_days % 7 },
    sex: child.sex,
    cleft: child.cleft,
    flags: flagsOf(record),
    teamStart: child.team_start_on === null ? null : date(child.team_start_on),
    transferredOn: child.transferred_on === null ? null : date(child.transferred_on),
    findings: findingsOf(record, imported, occurrences, rules),
    completions,
    parts: [...occurrences.filter((one) => !one.isComplete && !one.isWaived).flatMap(partsOf), ...draftedOf(record)],
    waivers: record.waivers.map((row) => ({
      milestone: row.milestone,
      on: date(row.waived_on),
      reason: row.reason,
      kind: row.kind,
    })),
    holds: record.holds.map((row) => ({
      milestone: row.milestone,
      on: date(row.held_on),
      reviewOn: date(row.review_on),
      reason: row.reason,
    })),
    bookings: record.bookings.map((row) => ({ milestone: row.milestone, on: date(row.booked_on) })),
    roots: rootsOf(completions, rules),
  };
};
