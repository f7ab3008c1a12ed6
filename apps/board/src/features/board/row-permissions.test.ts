import { describe, expect, test } from 'vitest';
import type { Me } from '@weftway/contract/session';
import { boardViewerOf, candidatesOf, claimOf, handingOf, releaseOf } from './row-permissions.ts';
import { aBoard, aRow } from './testing-board.ts';

const me = (id: string, discipline: Me['disciplines'][number], standing: Me['standing'] = 'member'): Me => ({
  id,
  name: id,
  email: `${id}@tern-estuary.example`,
  standing,
  disciplines: [discipline],
  supervisorId: null,
});
const loose = aRow({ holders: [null] });
const held = aRow({ holders: ['m-shirin'] });
const board = aBoard([loose]);

describe('what may be done with a row', () => {
  test('a speech therapist may claim what nobody holds, a surgeon may not and is told for whom it is', () => {
    expect(claimOf(boardViewerOf(me('m-hana', 'speech-therapist')), board, loose)).toMatchObject({ isAllowed: true });
    expect(claimOf(boardViewerOf(me('m-obed', 'surgeon')), board, loose)).toEqual({
      isAllowed: false,
      why: 'For a speech and language therapist to claim.',
    });
  });

  test('what somebody holds cannot be claimed, and the holder is named', () => {
    expect(claimOf(boardViewerOf(me('m-hana', 'speech-therapist')), board, held)).toEqual({
      isAllowed: false,
      why: 'Shirin Vaziri holds this.',
    });
  });

  test('the holder and the coordinator may hand on, others may not', () => {
    expect(handingOf(boardViewerOf(me('m-shirin', 'speech-therapist')), board, held)).toMatchObject({
      isAllowed: true,
      value: { from: 'm-shirin' },
    });
    expect(handingOf(boardViewerOf(me('m-ruth', 'coordinator')), board, loose)).toMatchObject({
      isAllowed: true,
      value: { from: null },
    });
    expect(handingOf(boardViewerOf(me('m-obed', 'surgeon')), board, held)).toMatchObject({ isAllowed: false });
  });

  test('only colleagues who may hold it are offered', () => {
    const handing = handingOf(boardViewerOf(me('m-shirin', 'speech-therapist')), board, held);
    if (!handing.isAllowed) throw new Error('The holder may hand on');
    expect(candidatesOf(board, held, handing.value).map((one) => one.name)).toEqual(['Hana Dvořák']);
  });

  test('a trainee may claim only for assigned children', () => {
    const trainee = boardViewerOf(me('m-gwen', 'speech-therapist', 'trainee'));
    expect(claimOf(trainee, board, loose)).toMatchObject({ isAllowed: false });
    expect(claimOf(trainee, board, { ...loose, child: { ...loose.child, traineeIds: ['m-gwen'] } })).toMatchObject({
      isAllowed: true,
    });
  });

  test('only the holder lets go', () => {
    expect(releaseOf(boardViewerOf(me('m-shirin', 'speech-therapist')), held)).toMatchObject({ isAllowed: true });
    expect(releaseOf(boardViewerOf(me('m-ruth', 'coordinator')), held)).toMatchObject({ isAllowed: false });
  });
});
