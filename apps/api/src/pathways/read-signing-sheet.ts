import { canMilestone } from '@weftway/abilities/ability-for';
import { readSigningSheet } from '@weftway/contract/pathway';
import { overridableChecks } from '@weftway/pathway/sign-off';
import { endpoint } from '../http/endpoint.ts';
import { answered, refused } from '../http/outcome.ts';
import { unknownFieldFaults } from './evidence-checks.ts';
import { openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import { hiddenFields } from './private-evidence.ts';
import { refusalLines } from './signing-refusal.ts';
import { evidenceLines, prepareSigning, roleOfSigner, sentenceOf } from './signing.ts';

/** Writes nothing; whoever may prepare a milestone sees what would be signed, signing itself asks for more. */
export const readSigningSheetEndpoint = endpoint<typeof readSigningSheet>({
  operation: readSigningSheet,
  can: { action: 'draft', subject: 'Milestone' },
  inTransaction: false,
  handle: async (ask) => {
    const { actor, ability, body, params, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const unknown = partRefusal(opened.rule, body.part);
    if (unknown !== null) return unknown;
    const subject = subjectOfPart(opened, body.part);
    if (!canMilestone(ability, 'draft', subject) && !canMilestone(ability, 'sign', subject))
      return refused('not-allowed', { detail: 'This is for somebody of another discipline to sign.' });
    const errors = unknownFieldFaults(opened.rule, body.part, body.values);
    if (errors.length > 0) return refused('bad-input', { errors });
    const prepared = prepareSigning(opened, actor, { ...body, overrides: [] }, today);
    const hidden = hiddenFields(opened.rule, actor, opened.record.child.lead_clinician_id);
    return answered(
      {
        sentence: sentenceOf(opened, prepared, body.part, body.performedOn),
        meaning: prepared.meaning,
        signAs: prepared.signedAs === null ? '' : `${actor.name}, ${roleOfSigner(prepared.signedAs, actor)}`,
        digest: prepared.digest,
        evidence: evidenceLines(opened, body.part, body.values, hidden),
        refusals: refusalLines(prepared.faults).map(({ code, text, field }) => ({ code, text, field })),
        overridable: overridableChecks(prepared.signing).map(({ check, cause, needsSecondName }) => ({
          check,
          text: `${check}: ${cause}`,
          needsSecondName,
        })),
      },
      params.childId,
    );
  },
});
