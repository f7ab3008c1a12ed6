/** A child on the path with milestones that somebody holds, written as the events that the operations would write. */
import { projectChildren } from '../pathways/project-children.ts';
import { appendEvents } from '../trail/append-events.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { childFields } from './child-fields.ts';
import type { TestApp } from './test-app.ts';

export const write = async (
  { db, services }: TestApp,
  childId: string,
  events: readonly TrailEvent[],
): Promise<void> => {
  const author = {
    at: services.now().toISOString(),
    actorId: 'coordinator',
    actorName: 'Test coordinator',
    actorRole: '',
    requestId: 'test',
  };
  await db.transaction(async (trx) => {
    await appendEvents(trx, events, author);
    await projectChildren(trx, [childId], services.today());
  });
};

/** A girl of eight weeks with a cleft of lip and palate. */
export const registerChild = async (test: TestApp, childId: string, recordNumber: string): Promise<void> => {
  const fields = childFields({ recordNumber, cleft: 'LAHSHAL' });
  await write(test, childId, [{ kind: 'child-registered', childId, after: { fields, protocolVersion: 1 } }]);
};

export const hold = async (
  test: TestApp,
  childId: string,
  memberId: string,
  milestone: string,
  part: string,
): Promise<void> =>
  write(test, childId, [{ kind: 'milestone-claimed', childId, memberId, milestone, after: { part, memberId } }]);
