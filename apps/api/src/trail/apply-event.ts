/** One door through which every event becomes facts; live use and rebuild share it. */
import type { Knex } from 'knex';
import type { EventKind } from '@weftway/contract/trail';
import { childAppliers } from '../children/apply-child-events.ts';
import { pathwayAppliers } from '../pathways/apply-pathway-events.ts';
import { protocolAppliers } from '../protocol/apply-protocol-events.ts';
import { teamAppliers } from '../team/apply-team-events.ts';
import type { Appliers, EventStamp, TrailEvent } from './trail-event.ts';

const appliers: Appliers<EventKind> = { ...teamAppliers, ...protocolAppliers, ...childAppliers, ...pathwayAppliers };

export const applyEvent = async (trx: Knex, event: TrailEvent, stamp: EventStamp): Promise<void> => {
  // The map is keyed by kind, so the applier fits the event; the compiler cannot follow the pairing through the union.
  const apply = appliers[event.kind] as (trx: Knex, event: TrailEvent, stamp: EventStamp) => Promise<void>;
  await apply(trx, event, stamp);
};
