import { canChild } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import type { BoardReader } from './board-cache.ts';

/** People who may open every child share one board; everybody else has their own. */
export const boardReaderOf = (ability: WeftwayAbility, actorId: string): BoardReader => {
  if (canChild(ability, 'read', { trainees: [] })) return { key: 'all', sees: () => true };
  return { key: actorId, sees: (trainees) => canChild(ability, 'read', { trainees }) };
};

export const seesEveryone = (reader: BoardReader): boolean => reader.key === 'all';
