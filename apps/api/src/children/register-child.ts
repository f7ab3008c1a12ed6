/** Adds a child or an expected child. What looks like a child already on the list is refused until told apart. */
import { canChild } from '@weftway/abilities/ability-for';
import { registerChild } from '@weftway/contract/child';
import type { ChildFields } from '@weftway/contract/child';
import type { FieldFault } from '@weftway/contract/problems';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { activeProtocolVersion } from '../protocol/protocol-store.ts';
import { checkChild } from './child-rules.ts';
import { viewChild } from './child-view.ts';
import { findDuplicateChildren } from './duplicate-view.ts';

const provisionalFault = (fields: ChildFields, mayConfirm: boolean): FieldFault[] =>
  mayConfirm || fields.isCleftProvisional
    ? []
    : [
        {
          pointer: '/fields/isCleftProvisional',
          detail: 'You can enter a provisional code; a surgeon, paediatrician, nurse or geneticist confirms it.',
        },
      ];

export const registerChildEndpoint = endpoint<typeof registerChild>({
  operation: registerChild,
  can: { action: 'register', subject: 'Child' },
  version: (child) => child.version,
  handle: async ({ trx, body, ability, today, services }) => {
    const { faults, fields } = await checkChild(trx, body.fields, null, { today, prefix: '/fields' });
    const errors = [...faults, ...provisionalFault(fields, canChild(ability, 'edit-cleft', { trainees: [] }))];
    if (errors.length > 0) return refused('bad-input', { errors });
    const candidates = await findDuplicateChildren(trx, fields, null);
    const sameNumber = candidates.find(({ why }) => why.includes('record-number'));
    if (sameNumber !== undefined) {
      return refused('duplicate-record', {
        detail: 'Another child has this record number. Each number belongs to one child.',
        errors: [{ pointer: '/fields/recordNumber', detail: 'Another child has this record number.' }],
        extra: { candidates },
      });
    }
    if (!body.isDistinct && candidates.some(({ why }) => why.includes('name-and-birth') || why.includes('name'))) {
      return refused('duplicate-record', {
        detail: 'A child with this name is on the list already. Look at the record, or say that this is another child.',
        extra: { candidates },
      });
    }
    const childId = services.newId();
    return done(
      [{ kind: 'child-registered', childId, after: { fields, protocolVersion: await activeProtocolVersion(trx) } }],
      () => viewChild(trx, childId),
    );
  },
});
