import type { MyWork, WorkGroup, WorkItem } from '@weftway/contract/board';
import { readMyWork, workGroups } from '@weftway/contract/board';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { gatherWork } from './my-work-entries.ts';
import { planChildren, workItemOf } from './work-items.ts';

/** Longer groups are cut; the board shows the rest. */
const mostInGroup: Readonly<Record<WorkGroup, number>> = {
  cameBack: 40,
  doNow: 60,
  toSign: 40,
  drafted: 40,
  waiting: 40,
  covers: 40,
  late: 20,
  looseEnds: 20,
};

export const readMyWorkEndpoint = endpoint<typeof readMyWork>({
  operation: readMyWork,
  can: { action: 'read', subject: 'MyWork' },
  handle: async ({ trx, actor, ability, today }) => {
    const { team, children, groups } = await gatherWork(trx, actor, ability, today);
    const shown = new Map(workGroups.map((group) => [group, (groups.get(group) ?? []).slice(0, mostInGroup[group])]));
    const known = new Set(children.keys());
    const further = new Set(
      [...shown.values()]
        .flatMap((entries) => entries.map((entry) => entry.row.child_id))
        .filter((id) => !known.has(id)),
    );
    const planned = new Map([...children, ...(await planChildren(trx, [...further], today))]);
    const itemsOf = (group: WorkGroup): WorkItem[] =>
      (shown.get(group) ?? []).map((entry) => workItemOf(entry, planned, team, today));
    const totals = Object.fromEntries(
      workGroups.map((group) => [group, groups.get(group)?.length ?? 0]),
    ) as MyWork['totals']; // one entry for each group
    return answered({
      today,
      cameBack: itemsOf('cameBack'),
      doNow: itemsOf('doNow'),
      toSign: itemsOf('toSign'),
      drafted: itemsOf('drafted'),
      waiting: itemsOf('waiting'),
      covers: itemsOf('covers'),
      late: itemsOf('late'),
      looseEnds: itemsOf('looseEnds'),
      totals,
    });
  },
});
