/** Facts about protocol versions. */
import type { Appliers } from '../trail/trail-event.ts';

type ProtocolEvents = 'protocol-added' | 'protocol-activated';

export const protocolAppliers: Appliers<ProtocolEvents> = {
  'protocol-added': async (trx, { after }, stamp) => {
    await trx('protocols').insert({
      version: after.version,
      name: after.document.name,
      document: JSON.stringify(after.document),
      status: 'draft',
      changes: after.changes,
      created_at: stamp.at,
      created_by_id: stamp.actorId,
    });
  },
  'protocol-activated': async (trx, { after }, stamp) => {
    await trx('protocols').where({ status: 'active' }).update({ status: 'retired' });
    await trx('protocols').where({ version: after.version }).update({
      status: 'active',
      activated_at: stamp.at,
      activated_by_id: stamp.actorId,
      agreed_by: after.agreedBy,
    });
  },
};
