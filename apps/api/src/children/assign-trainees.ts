import { assignTrainees } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { reachChild } from './child-reach.ts';
import { traineeIdsOf } from './child-view.ts';
import { isTrainee } from './team-choices-view.ts';

export const assignTraineesEndpoint = endpoint<typeof assignTrainees>({
  operation: assignTrainees,
  can: { action: 'assign', subject: 'Child' },
  handle: async (ask) => {
    const { trx, body } = ask;
    const reached = await reachChild(ask, ask.params.childId, ['assign']);
    if (reached.kind === 'refused') return reached;
    const childId = reached.row.id;
    const memberIds = [...new Set(body.memberIds)].toSorted();
    const known = await Promise.all(body.memberIds.map((id) => isTrainee(trx, id)));
    const errors = known.flatMap((is, index) =>
      is ? [] : [{ pointer: `/memberIds/${index}`, detail: 'This person is not a trainee on the team today.' }],
    );
    if (errors.length > 0) return refused('bad-input', { errors });
    const isSame = memberIds.join() === [...reached.traineeIds].toSorted().join();
    const events = isSame
      ? []
      : [
          {
            kind: 'trainees-assigned' as const,
            childId,
            before: { memberIds: reached.traineeIds },
            after: { memberIds },
          },
        ];
    return done(events, async () => ({ memberIds: await traineeIdsOf(trx, childId) }));
  },
});
