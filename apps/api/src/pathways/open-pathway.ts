/** Opens a child's pathway for the asker: the record, the plan of today and the milestone that is meant, or a refusal. */
import type { Knex } from 'knex';
import { canChild } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import { partSubject, wholeSubject } from '@weftway/abilities/milestone-subject';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import type { PathwayPlan, PlannedMilestone } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import type { Person } from '@weftway/pathway/sign-off-person';
import { whoCanHelp } from '../children/team-choices-view.ts';
import type { Actor } from '../http/endpoint.ts';
import { fieldRefused, refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { loadProtocol } from '../protocol/protocol-store.ts';
import { pathwayFactsOf } from './pathway-facts-of.ts';
import { loadPathway } from './pathway-store.ts';
import type { ClaimRow, PathwayRecord } from './pathway-store.ts';
import { halfSigned, signedOccurrences } from './signed-entries.ts';
import type { SignedOccurrence } from './signed-entries.ts';
import { protocolOf, ruleIdOf, rulesOf } from './whole-protocol.ts';

export interface Asking {
  readonly trx: Knex;
  readonly ability: WeftwayAbility;
  readonly actor: Actor;
  readonly today: PlainDate;
}

export interface OpenedPathway {
  readonly kind: 'opened';
  readonly record: PathwayRecord;
  /** The team's protocol with the child's own milestones. */
  readonly protocol: Protocol;
  readonly rules: ReadonlyMap<string, MilestoneRule>;
  readonly facts: PathwayFacts;
  readonly plan: PathwayPlan;
  readonly occurrences: readonly SignedOccurrence[];
}

export interface OpenedMilestone extends OpenedPathway {
  /** The key under which facts are kept. */
  readonly key: string;
  readonly rule: MilestoneRule;
  /** Null when it is not on the path. */
  readonly planned: PlannedMilestone | null;
}

export const openPathway = async (
  { trx, ability, today }: Asking,
  childId: string,
): Promise<OpenedPathway | Refused> => {
  const record = await loadPathway(trx, childId);
  if (record === null) return refused('not-found');
  if (!canChild(ability, 'read', { trainees: record.trainees })) {
    return refused('not-allowed', {
      detail: `This child is not among yours. Ask ${await whoCanHelp(trx, record.child.lead_clinician_id)}.`,
    });
  }
  const team = await loadProtocol(trx, record.child.protocol_version);
  const protocol = protocolOf(team, record.own);
  const rules = rulesOf(protocol);
  const facts = pathwayFactsOf(record, team);
  return {
    kind: 'opened',
    record,
    protocol,
    rules,
    facts,
    plan: planPathway(protocol, facts, today, { reasons: false }),
    occurrences: signedOccurrences(record, rules),
  };
};

/** The planned milestone of a key; a plain id is enough while it is the only one of its kind on the path. */
export const plannedOf = (plan: PathwayPlan, key: string): PlannedMilestone | null => {
  const exact = plan.milestones.find((one) => one.key === key);
  if (exact !== undefined) return exact;
  const ofRule = key.includes(':') ? [] : plan.milestones.filter((one) => one.id === key);
  return ofRule.length === 1 ? (ofRule[0] ?? null) : null;
};

export const openMilestone = async (
  asking: Asking,
  params: { readonly childId: string; readonly milestone: string },
): Promise<OpenedMilestone | Refused> => {
  const opened = await openPathway(asking, params.childId);
  if (opened.kind === 'refused') return opened;
  const rule = opened.rules.get(ruleIdOf(params.milestone));
  if (rule === undefined) return refused('not-found');
  const planned = plannedOf(opened.plan, params.milestone);
  return { ...opened, key: planned?.key ?? params.milestone, rule, planned };
};

export const claimOf = (record: PathwayRecord, key: string, part: string): ClaimRow | null =>
  record.claims.find((claim) => claim.milestone === key && claim.part === part) ?? null;

/** Refuses a part that the milestone does not have. */
export const partRefusal = (rule: MilestoneRule, part: string): Refused | null =>
  rule.signatures.some((signature) => signature.part === part)
    ? null
    : fieldRefused(
        '/part',
        `The parts of this milestone are: ${rule.signatures.map((signature) => signature.part).join(', ')}.`,
      );

const holdingChild = (record: PathwayRecord) => ({
  leadClinicianId: record.child.lead_clinician_id,
  trainees: record.trainees,
});

/** What the permission table reads of one part. */
export const subjectOfPart = ({ record, key, rule }: OpenedMilestone, part: string) =>
  partSubject(rule, part, holdingChild(record), claimOf(record, key, part)?.member_id ?? null);

export const subjectOfWhole = ({ record, rule }: OpenedMilestone) => wholeSubject(rule, holdingChild(record));

/** The person as the sign-off rules read them. */
export const personOf = (
  record: PathwayRecord,
  person: Pick<Actor, 'id' | 'name' | 'standing' | 'disciplines'>,
): Person => ({
  id: person.id,
  name: person.name,
  standing: person.standing,
  disciplines: person.disciplines,
  isLeadClinician: record.child.lead_clinician_id === person.id,
});

/**
 * Number of the occurrence that a signature would belong to: of a half-signed one, else the awaited one. Numbers that
 * signatures have used are never used again, also when a visit is written down after a later one.
 */
export const occurrenceToSign = ({ occurrences, key, planned }: OpenedMilestone): number => {
  const half = halfSigned(occurrences, key);
  if (half !== null) return half.occurrence;
  const used = occurrences.filter((one) => one.milestone === key).map((one) => one.occurrence);
  return Math.max(planned?.occurrence ?? 1, ...used.map((one) => one + 1));
};
