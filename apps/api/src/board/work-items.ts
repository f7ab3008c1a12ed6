/** Dresses the rows of My work: the children that are listed are planned afresh to say what stands in the way. */
import type { Knex } from 'knex';
import { daysBetween } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { WorkItem } from '@weftway/contract/board';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { PlannedMilestone } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { pathwayFactsOf } from '../pathways/pathway-facts-of.ts';
import { loadPathways } from '../pathways/pathway-store.ts';
import type { PathwayRecord } from '../pathways/pathway-store.ts';
import { evidenceOf } from '../pathways/signed-entries.ts';
import { protocolOf, ruleIdOf, rulesOf } from '../pathways/whole-protocol.ts';
import { loadProtocol } from '../protocol/protocol-store.ts';
import type { TeamMember, WorkRow } from './my-work-view.ts';
import { missingEvidence, standsInTheWay } from './stands-in-the-way.ts';
import type { WorkEntry } from './work-groups.ts';

interface PlannedChild {
  readonly record: PathwayRecord;
  readonly rules: ReadonlyMap<string, MilestoneRule>;
  readonly planned: ReadonlyMap<string, PlannedMilestone>;
}

export type PlannedChildren = ReadonlyMap<string, PlannedChild>;

/** Everything recorded about these children, and their plan of today without its reasons. */
export const planChildren = async (
  db: Knex,
  childIds: readonly string[],
  today: PlainDate,
): Promise<PlannedChildren> => {
  const children = new Map<string, PlannedChild>();
  for (const record of await loadPathways(db, childIds)) {
    const protocol = await loadProtocol(db, record.child.protocol_version);
    const whole = protocolOf(protocol, record.own);
    const plan = planPathway(whole, pathwayFactsOf(record, protocol), today, { reasons: false });
    children.set(record.child.id, {
      record,
      rules: rulesOf(whole),
      planned: new Map(plan.milestones.map((one) => [one.key, one])),
    });
  }
  return children;
};

const draftOf = (record: PathwayRecord, milestone: string, part: string) => {
  const draft = record.drafts.find((one) => one.milestone === milestone && one.part === part);
  return draft === undefined ? null : evidenceOf(draft);
};

const wayOf = (child: PlannedChild, entry: WorkEntry, team: ReadonlyMap<string, TeamMember>): string => {
  const { record, rules } = child;
  const { milestone } = entry.row;
  const planned = child.planned.get(milestone);
  const rule = rules.get(ruleIdOf(milestone));
  if (planned === undefined || rule === undefined) return '';
  const hold = record.holds.find((one) => one.milestone === milestone);
  return standsInTheWay({
    planned,
    rule,
    part: entry.part,
    hold: planned.state !== 'held' || hold === undefined ? null : { reason: hold.reason, reviewOn: hold.review_on },
    bookedOn: record.bookings.find((one) => one.milestone === milestone)?.booked_on ?? null,
    drafted: draftOf(record, milestone, entry.part),
    titleOf: (key) => rules.get(ruleIdOf(key))?.shortTitle ?? key,
    holderOf: (key) => {
      const claim = record.claims.find((one) => one.milestone === key);
      return claim === undefined ? null : (team.get(claim.member_id)?.name ?? null);
    },
  });
};

/** Whether something has been entered and nothing is left to enter for this part. */
export const isEvidenceComplete = (children: PlannedChildren, row: WorkRow, part: string): boolean => {
  const child = children.get(row.child_id);
  const rule = child?.rules.get(ruleIdOf(row.milestone));
  const planned = child?.planned.get(row.milestone);
  if (child === undefined || rule === undefined || planned === undefined) return false;
  const drafted = draftOf(child.record, row.milestone, part);
  const isBlocked = planned.waitsFor.some((wait) => wait.type !== 'soft' && !wait.isMet);
  return drafted !== null && !isBlocked && missingEvidence(rule, part, drafted).length === 0;
};

const windowOf = ({ earliest, target, latest, closing }: WorkRow): WorkItem['window'] =>
  earliest === null || target === null || latest === null || closing === null
    ? null
    : { earliest, target, latest, closing };

export const workItemOf = (
  entry: WorkEntry,
  children: PlannedChildren,
  team: ReadonlyMap<string, TeamMember>,
  today: PlainDate,
): WorkItem => {
  const { row, part, ownerId, note } = entry;
  const child = children.get(row.child_id);
  const rule = child?.rules.get(ruleIdOf(row.milestone));
  return {
    childId: row.child_id,
    childName: `${row.first_name} ${row.family_name}`,
    bornOn: row.born_on,
    milestone: row.milestone,
    title: rule?.shortTitle ?? row.milestone,
    part,
    lane: row.lane,
    state: row.state,
    isDue: row.is_due === 1,
    isUnowned: ownerId === null,
    ownerName: ownerId === null ? null : (team.get(ownerId)?.name ?? null),
    window: windowOf(row),
    daysLeft: row.latest === null ? null : daysBetween(today, row.latest as PlainDate), // the projection writes checked dates
    standsInTheWay: child === undefined ? '' : wayOf(child, entry, team),
    note,
  };
};
