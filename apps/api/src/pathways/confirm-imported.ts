import { canMilestone } from '@weftway/abilities/ability-for';
import { confirmImported } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { openMilestone, subjectOfWhole } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';

export const confirmImportedEndpoint = endpoint<typeof confirmImported>({
  operation: confirmImported,
  can: { action: 'confirm', subject: 'Milestone' },
  confirmsPassword: true,
  handle: async (ask) => {
    const { trx, actor, ability, params } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    if (!canMilestone(ability, 'confirm', subjectOfWhole(opened)))
      return refused('not-allowed', { detail: 'A surgeon who could have signed it confirms it.' });
    // The record of another team may name no side where this team has only one.
    const { key, rule, record } = opened;
    const waiting = record.imported.filter(
      (row) => row.is_unverified === 1 && (row.milestone === key || row.milestone === rule.id),
    );
    const milestone = waiting[0]?.milestone;
    if (milestone === undefined)
      return refused('milestone-state-refuses', {
        detail: 'Nothing here waits for confirmation.',
        extra: { reason: 'nothing-to-confirm' },
      });
    return done(
      [
        {
          kind: 'import-confirmed',
          childId: params.childId,
          milestone,
          before: { performedOn: waiting.map((row) => row.performed_on), isUnverified: true },
          after: {},
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
