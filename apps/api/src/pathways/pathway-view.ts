/** A child's pathway as the contract shows it to one reader. */
import type { Knex } from 'knex';
import type { Draft, Pathway } from '@weftway/contract/pathway';
import { childOf } from '../children/child-view.ts';
import { loadProtocol } from '../protocol/protocol-store.ts';
import { historyOf } from './history-store.ts';
import { historyLine } from './history-words.ts';
import { memberNames } from './members-store.ts';
import { pathwayFactsOf } from './pathway-facts-of.ts';
import { loadPathway, signatureOf } from './pathway-store.ts';
import type { DraftRow, PathwayRecord } from './pathway-store.ts';
import { factsFor, hiddenFields, withoutHidden } from './private-evidence.ts';
import type { Reader } from './private-evidence.ts';
import { evidenceOf } from './signed-entries.ts';
import { ownRulesOf, protocolOf, ruleIdOf, rulesOf } from './whole-protocol.ts';

const draftOf = (row: DraftRow): Draft => ({
  milestone: row.milestone,
  part: row.part,
  occurrence: row.occurrence,
  version: row.version,
  values: evidenceOf(row),
  performedOn: row.performed_on as Draft['performedOn'], // stored as a checked date
  byId: row.by_id,
  at: row.at,
  isReady: row.is_ready === 1,
});

const historyFor = async (db: Knex, childId: string): Promise<Pathway['history']> => {
  const rows = await historyOf(db, childId);
  const names = await memberNames(db);
  return rows.map((row) => ({
    seq: row.seq,
    at: row.at,
    kind: row.kind,
    byName: row.actor_name,
    milestone: row.milestone,
    detail: historyLine(row.kind, JSON.parse(row.after), (id) => names.get(id) ?? 'somebody who has left'),
  }));
};

export const pathwayOf = async (db: Knex, record: PathwayRecord, reader: Reader): Promise<Pathway> => {
  const { child } = record;
  const team = await loadProtocol(db, child.protocol_version);
  const rules = rulesOf(protocolOf(team, record.own));
  const hiddenOf = (milestone: string): readonly string[] =>
    hiddenFields(rules.get(ruleIdOf(milestone)), reader, child.lead_clinician_id);
  return {
    child: childOf(child, record.trainees),
    version: child.pathway_version,
    facts: factsFor(pathwayFactsOf(record, team), hiddenOf),
    protocolVersion: child.protocol_version,
    ownMilestones: ownRulesOf(record.own),
    claims: record.claims.map((claim) => ({
      milestone: claim.milestone,
      part: claim.part,
      memberId: claim.member_id,
      since: claim.since,
    })),
    drafts: record.drafts
      .map(draftOf)
      .map((draft) => ({ ...draft, values: withoutHidden(draft.values, hiddenOf(draft.milestone)) })),
    signatures: record.signatures
      .map(signatureOf)
      .map((signature) => ({ ...signature, values: withoutHidden(signature.values, hiddenOf(signature.milestone)) })),
    trainees: [...record.trainees],
    history: await historyFor(db, child.id),
  };
};

/** The pathway as it stands after a change. Throws when the child does not exist: callers have found it before. */
export const viewPathway = async (db: Knex, childId: string, reader: Reader): Promise<Pathway> => {
  const record = await loadPathway(db, childId);
  if (record === null) throw new Error('The child was not found');
  return pathwayOf(db, record, reader);
};

/** One draft as the reader may see it, or null. */
export const draftFor = (record: PathwayRecord, key: string, part: string, hidden: readonly string[]): Draft | null => {
  const row = record.drafts.find((draft) => draft.milestone === key && draft.part === part);
  if (row === undefined) return null;
  const draft = draftOf(row);
  return { ...draft, values: withoutHidden(draft.values, hidden) };
};
