/** Finds a child for the asker, or refuses: unknown children are not found, closed ones say who can open them. */
import type { Knex } from 'knex';
import { canChild } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import type { Action } from '@weftway/abilities/permission-table';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { findChildRow, traineeIdsOf } from './child-view.ts';
import type { ChildRowRecord } from './child-view.ts';
import { whoCanHelp } from './team-choices-view.ts';

interface Asker {
  readonly trx: Knex;
  readonly ability: WeftwayAbility;
}

export interface ReachedChild {
  readonly kind: 'reached';
  readonly row: ChildRowRecord;
  readonly traineeIds: readonly string[];
}

/** The asker must be able to open the child and to do at least one of `actions`. */
export const reachChild = async (
  { trx, ability }: Asker,
  childId: string,
  actions: readonly Action[],
): Promise<ReachedChild | Refused> => {
  const row = await findChildRow(trx, childId);
  if (row === null) return refused('not-found');
  const traineeIds = await traineeIdsOf(trx, childId);
  const child = { trainees: traineeIds };
  if (!canChild(ability, 'read', child)) {
    return refused('not-allowed', {
      detail: `This child is not among yours. Ask ${await whoCanHelp(trx, row.lead_clinician_id)}.`,
    });
  }
  return actions.some((action) => canChild(ability, action, child))
    ? { kind: 'reached', row, traineeIds }
    : refused('not-allowed');
};
