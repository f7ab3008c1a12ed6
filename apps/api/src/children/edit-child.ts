/** Changes a record. Identity belongs to coordinator and nurse, the cleft and its flags to the clinicians. */
import { canChild } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import { editChild } from '@weftway/contract/child';
import type { ChildFields } from '@weftway/contract/child';
import type { FieldFault } from '@weftway/contract/problems';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { reachChild } from './child-reach.ts';
import { changedFields, checkChild, cleftFieldNames } from './child-rules.ts';
import { childOf, fieldsOf, viewChild } from './child-view.ts';
import { findDuplicateChildren } from './duplicate-view.ts';

const isCleftField = (name: keyof ChildFields): boolean =>
  (cleftFieldNames as readonly (keyof ChildFields)[]).includes(name);

const reachFaults = (
  changed: readonly (keyof ChildFields)[],
  ability: WeftwayAbility,
  trainees: readonly string[],
): FieldFault[] => {
  const mayIdentity = canChild(ability, 'edit', { trainees });
  const mayCleft = canChild(ability, 'edit-cleft', { trainees });
  return changed.flatMap((name) => {
    if (isCleftField(name))
      return mayCleft
        ? []
        : [{ pointer: `/${name}`, detail: 'A surgeon, paediatrician, nurse or geneticist changes this.' }];
    return mayIdentity ? [] : [{ pointer: `/${name}`, detail: 'The coordinator or a nurse changes this.' }];
  });
};

export const editChildEndpoint = endpoint<typeof editChild>({
  operation: editChild,
  can: { action: 'read', subject: 'Child' },
  version: (child) => child.version,
  handle: async (ask) => {
    const { trx, body, ability, ifMatch } = ask;
    const reached = await reachChild(ask, ask.params.childId, ['edit', 'edit-cleft']);
    if (reached.kind === 'refused') return reached;
    const { row, traineeIds } = reached;
    if (ifMatch !== row.version) {
      return refused('changed-meanwhile', {
        detail: 'Compare the two versions and send the one that holds.',
        extra: { current: childOf(row, traineeIds), versions: { yours: ifMatch, current: row.version } },
      });
    }
    const before = fieldsOf(row);
    const { faults, fields } = await checkChild(trx, body, before, { today: ask.today, prefix: '' });
    const changed = changedFields(before, fields);
    const errors = [...faults, ...reachFaults(changed, ability, traineeIds)];
    if (errors.length > 0) return refused('bad-input', { errors });
    const candidates = changed.includes('recordNumber') ? await findDuplicateChildren(trx, fields, row.id) : [];
    if (candidates.some(({ why }) => why.includes('record-number'))) {
      return refused('duplicate-record', {
        detail: 'Another child has this record number.',
        errors: [{ pointer: '/recordNumber', detail: 'Another child has this record number.' }],
        extra: { candidates },
      });
    }
    const events =
      changed.length === 0
        ? []
        : [{ kind: 'child-edited' as const, childId: row.id, before: { fields: before }, after: { fields } }];
    return done(events, () => viewChild(trx, row.id));
  },
});
