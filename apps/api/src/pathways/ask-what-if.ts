import { askWhatIf } from '@weftway/contract/pathway-of-child';
import { whatIf } from '@weftway/pathway/what-if';
import type { Foreseen, PathwayChange } from '@weftway/pathway/what-if';
import { endpoint } from '../http/endpoint.ts';
import { answered, fieldRefused } from '../http/outcome.ts';
import { openPathway, plannedOf } from './open-pathway.ts';
import { ruleIdOf } from './whole-protocol.ts';

const shown = ({ window, state, clinical }: Foreseen) => ({
  state: state ?? clinical,
  earliest: window?.earliest ?? null,
  target: window?.target ?? null,
  latest: window?.latest ?? null,
});

/** Plans twice and compares; nothing is written. */
export const askWhatIfEndpoint = endpoint<typeof askWhatIf>({
  operation: askWhatIf,
  can: { action: 'read', subject: 'Child' },
  inTransaction: false,
  handle: async (ask) => {
    const { body, params, today } = ask;
    const opened = await openPathway(ask, params.childId);
    if (opened.kind === 'refused') return opened;
    const { plan, rules, protocol, facts } = opened;
    const planned = plannedOf(plan, body.milestone);
    if (planned === null) return fieldRefused('/milestone', 'This is not on the path of this child.');
    if (body.change.kind === 'book' && body.change.on < today)
      return fieldRefused('/change/on', 'The day lies in the past.');
    const change: PathwayChange = { ...body.change, milestone: planned.key };
    const moved = whatIf(protocol, facts, today, change).map(({ key, before, after, daysMoved }) => ({
      milestone: key,
      title: rules.get(ruleIdOf(key))?.title ?? key,
      before: shown(before),
      after: shown(after),
      days: daysMoved === null ? 0 : daysMoved.earliest || daysMoved.target || daysMoved.latest,
    }));
    return answered({ moved }, params.childId);
  },
});
