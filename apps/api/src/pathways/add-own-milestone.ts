import { canChild } from '@weftway/abilities/ability-for';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { addOwnMilestone } from '@weftway/contract/pathway-of-child';
import type { FieldFault } from '@weftway/contract/problems';
import { milestoneCatalogue, ownMilestone } from '@weftway/pathway/milestone-catalogue';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { openPathway } from './open-pathway.ts';
import type { OwnRow } from './pathway-store.ts';
import { viewPathway } from './pathway-view.ts';

/** Numbers run from 1 to 999 on each child and are never used again. */
const nextNumber = (own: readonly OwnRow[]): number =>
  Math.max(0, ...own.map((row) => Number(row.id.split('-')[1] ?? 0))) + 1;

interface Days {
  readonly earliest: PlainDate;
  readonly target: PlainDate;
  readonly latest: PlainDate;
}

const dayFaults = ({ earliest, target, latest }: Days, birth: PlainDate | null, today: PlainDate): FieldFault[] => [
  ...(birth !== null && earliest < birth
    ? [{ pointer: '/earliest', detail: 'The day lies before the birth of the child.' }]
    : []),
  ...(target < earliest ? [{ pointer: '/target', detail: 'The target cannot lie before the opening.' }] : []),
  ...(latest < target ? [{ pointer: '/latest', detail: 'The latest day cannot lie before the target.' }] : []),
  ...(latest < today ? [{ pointer: '/latest', detail: 'The latest day lies in the past.' }] : []),
];

export const addOwnMilestoneEndpoint = endpoint<typeof addOwnMilestone>({
  operation: addOwnMilestone,
  can: { action: 'add-milestone', subject: 'Child' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openPathway(ask, params.childId);
    if (opened.kind === 'refused') return opened;
    const { record, facts } = opened;
    if (!canChild(ability, 'add-milestone', { trainees: record.trainees })) return refused('not-allowed');
    if (record.child.care_ended_on !== null)
      return refused('not-allowed', { detail: 'Care of this child has ended; nothing new is begun.' });
    const template = milestoneCatalogue.find((one) => one.id === body.catalogueId);
    const number = nextNumber(record.own);
    const errors = [
      ...(template === undefined ? [{ pointer: '/catalogueId', detail: 'Choose one of the catalogue.' }] : []),
      ...(number > 999 ? [{ pointer: '/catalogueId', detail: 'This child has too many milestones of its own.' }] : []),
      ...dayFaults(body, facts.birth, today),
    ];
    if (template === undefined || errors.length > 0) return refused('bad-input', { errors });
    const { rule } = ownMilestone(template, {
      number,
      title: body.title,
      addedOn: today,
      earliest: body.earliest,
      target: body.target,
      latest: body.latest,
    });
    return done(
      [
        {
          kind: 'own-milestone-added',
          childId: params.childId,
          milestone: rule.id,
          after: { rule, reason: body.reason, addedOn: today },
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
