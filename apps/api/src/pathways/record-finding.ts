import { canChild } from '@weftway/abilities/ability-for';
import { recordFinding } from '@weftway/contract/pathway-of-child';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { openPathway } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { findingsOfProtocol } from './protocol-findings.ts';

export const recordFindingEndpoint = endpoint<typeof recordFinding>({
  operation: recordFinding,
  can: { action: 'record-finding', subject: 'Child' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openPathway(ask, params.childId);
    if (opened.kind === 'refused') return opened;
    const { record, facts, rules } = opened;
    if (!canChild(ability, 'record-finding', { trainees: record.trainees })) return refused('not-allowed');
    const stored = record.findings.find((row) => row.name === body.name) ?? null;
    const place = {
      childId: params.childId,
      before: stored === null ? null : { name: stored.name, on: stored.found_on, note: stored.note },
    };
    const view = () => viewPathway(trx, params.childId, actor);
    if (!body.isPresent) {
      if (stored !== null)
        return done([{ kind: 'finding-withdrawn', ...place, after: { name: body.name, note: body.note } }], view);
      const isRaised = facts.findings.some((finding) => finding.name === body.name);
      return fieldRefused(
        '/name',
        isRaised ? 'This comes from a signed record; amend that.' : 'This was not recorded.',
      );
    }
    if (!findingsOfProtocol(rules).has(body.name))
      return fieldRefused('/name', 'The protocol of this child does not know this finding.');
    if (body.on > today) return fieldRefused('/on', 'The day lies in the future.');
    if (facts.birth !== null && body.on < facts.birth)
      return fieldRefused('/on', 'The day lies before the birth of the child.');
    return done(
      [{ kind: 'finding-recorded', ...place, after: { name: body.name, on: body.on, note: body.note } }],
      view,
    );
  },
});
