import { expect, test } from 'vitest';
import {
  builtChild,
  day,
  orthodontist,
  signature,
  speechTherapist,
  surgeon,
  trainee,
} from '../../../testing/pathway-builders.ts';
import { fromDay, mergeDrafts } from './evidence.ts';
import { findingNames } from './finding-names.ts';
import { movedBetween } from './moved.ts';
import { milestonePermissions, partPermissions, viewerOf } from './permissions.ts';
import { dependenciesOf, keyOfItem, rulerItems, rulerLanes } from './ruler-items.ts';

const partOf = (built: ReturnType<typeof builtChild>, key: string, at = 0) => {
  const part = built.view(key).parts[at];
  if (part === undefined) throw new Error('no such part');
  return part;
};

test('signing late lip repair moves only the opening of the palate repair, with the step that is new', () => {
  const before = builtChild({}, day('2026-09-01'));
  const after = builtChild(
    { facts: { completions: [{ milestone: 'SURG-01', on: day('2026-08-20') }] } },
    day('2026-09-01'),
  );
  const moves = movedBetween(before.of.plan, after.of.plan, 'SURG-01');
  const palate = moves.find((move) => move.key === 'SURG-03');
  expect(palate?.dates.map(({ which, days }) => [which, days])).toEqual([['earliest', 28]]);
  expect(palate?.dates[0]?.because).toMatchObject({ rule: 'gate-moved', event: { name: 'SURG-01' } });
  expect(moves.find((move) => move.key === 'SURG-02')?.kind).toBe('came');
  expect(moves.some((move) => move.key === 'SURG-01')).toBe(false);
});

test('two drafts merge by field, and only what both changed is asked about', () => {
  const merge = mergeDrafts(
    { a: { value: '1' }, b: { value: '1' } },
    { a: { value: '2' }, b: { value: '1' }, c: { value: 'mine' } },
    { a: { value: '3' }, b: { value: '4' } },
  );
  expect(merge.values).toEqual({ a: { value: '2' }, b: { value: '4' }, c: { value: 'mine' } });
  expect(merge.both).toEqual([{ name: 'a', mine: { value: '2' }, theirs: { value: '3' } }]);
});

test('the same change by both is no question', () => {
  expect(mergeDrafts({}, { a: { value: '2' } }, { a: { value: '2' } }).both).toEqual([]);
});

test('the day brings the date and the age, and leaves alone what somebody wrote', () => {
  const fields = builtChild().view('SURG-01').rule.evidence;
  const first = fromDay(fields, {}, '2026-05-12', '', day('2026-01-15'));
  expect(first).toMatchObject({ operation_date: { value: '2026-05-12' }, age_days: { value: '117' } });
  const corrected = { ...first, age_days: { value: '118' } };
  expect(fromDay(fields, corrected, '2026-05-13', '2026-05-12', day('2026-01-15'))).toMatchObject({
    operation_date: { value: '2026-05-13' },
    age_days: { value: '118' },
  });
});

test('a therapist cannot sign, hold or waive an operation, and is told whose it is', () => {
  const built = builtChild();
  const viewer = viewerOf(speechTherapist, built.of.pathway);
  const may = partPermissions(viewer, built.view('SURG-01'), partOf(built, 'SURG-01'));
  expect(may.sign).toBe('For a cleft surgeon to do.');
  expect(may.claim).toContain('cleft surgeon');
  expect(milestonePermissions(viewer, built.view('SURG-01')).hold).toBe('For a cleft surgeon to do.');
});

test('a surgeon may do all of it; a trainee prepares when assigned', () => {
  const built = builtChild({ trainees: ['m-4'] });
  const view = built.view('SURG-01');
  expect(partPermissions(viewerOf(surgeon, built.of.pathway), view, partOf(built, 'SURG-01'))).toMatchObject({
    claim: null,
    draft: null,
    sign: null,
  });
  const prepares = partPermissions(viewerOf(trainee, built.of.pathway), view, partOf(built, 'SURG-01'));
  expect(prepares.draft).toBeNull();
  expect(prepares.sign).toContain('A trainee prepares');
});

test('who holds it is told to the next who would claim it', () => {
  const built = builtChild({
    claims: [{ milestone: 'SURG-01', part: 'milestone', memberId: 'm-1', since: '2026-02-01T09:00:00Z' }],
  });
  const view = built.view('SURG-01');
  expect(view.ownerNames).toBe('Obed Nkansah');
  expect(view.unowned).toBe(false);
  expect(
    partPermissions(viewerOf({ ...surgeon, id: 'm-9' }, built.of.pathway), view, partOf(built, 'SURG-01')).claim,
  ).toBe('Obed Nkansah holds it.');
});

test('each half of two signatures has its own owner and its own signature', () => {
  const graft = builtChild(
    {
      fields: { bornOn: day('2018-08-01') },
      facts: {
        birth: day('2018-08-01'),
        parts: [{ milestone: 'ORTH-05:L', part: 'readiness', on: day('2026-11-20'), kind: 'signed' }],
      },
      signatures: [
        signature({
          milestone: 'ORTH-05:L',
          part: 'readiness',
          performedOn: day('2026-11-20'),
          signerId: 'm-2',
          signerName: 'Ines Calder',
        }),
      ],
      claims: [{ milestone: 'ORTH-05:L', part: 'operation', memberId: 'm-1', since: '2026-11-01T09:00:00Z' }],
    },
    day('2026-12-01'),
  );
  const view = graft.view('ORTH-05:L');
  expect(view.planned.state).toBe('partly-signed');
  expect(view.title).toBe('Bone graft to the gum, left');
  expect(view.parts.map((part) => part.signature?.signerName ?? null)).toEqual(['Ines Calder', null]);
  expect(view.ownerNames).toBe('Obed Nkansah');
  const may = partPermissions(viewerOf(orthodontist, graft.of.pathway), view, partOf(graft, 'ORTH-05:L'));
  expect(may.sign).toBe('Ines Calder has signed this part.');
});

test('past times are knots and coming ones are loops on the same thread', () => {
  const built = builtChild({
    facts: {
      completions: [
        { milestone: 'CARE-02', on: day('2026-01-20') },
        { milestone: 'CARE-02', on: day('2026-02-03') },
      ],
    },
  });
  const items = rulerItems(built.of, built.views, []).filter((item) => keyOfItem(item.key) === 'CARE-02');
  expect(items.filter((item) => item.isPast && item.state === 'signed').map((item) => item.knotOn)).toEqual([
    '2026-01-20',
    '2026-02-03',
  ]);
  const loops = items.filter((item) => item.isPast && item.state === 'ahead');
  expect(loops.length).toBeGreaterThan(2);
  expect(loops.every((item) => (item.knotOn ?? '') > '2026-04-20')).toBe(true);
});

test('what moved leaves its old window behind as a ghost', () => {
  const before = builtChild({}, day('2026-09-01'));
  const after = builtChild(
    { facts: { completions: [{ milestone: 'SURG-01', on: day('2026-08-20') }] } },
    day('2026-09-01'),
  );
  const items = rulerItems(after.of, after.views, movedBetween(before.of.plan, after.of.plan));
  expect(items.find((item) => item.key === 'SURG-03')?.ghostWindow?.earliest).toBe('2026-10-15');
});

test('one thread is dyed: the one that the viewer signs most of', () => {
  const built = builtChild();
  const own = (disciplines: typeof surgeon.disciplines) =>
    rulerLanes(built.views, { id: 'm-1', disciplines })
      .filter((lane) => lane.isOwn)
      .map((lane) => lane.lane);
  expect(own(['surgeon'])).toEqual(['surgery']);
  expect(own(['speech-therapist'])).toEqual(['speech']);
});

test('the chosen milestone points to what it waits for', () => {
  const built = builtChild({
    facts: {
      findings: [
        { name: 'molding_started', on: day('2026-02-09') },
        { name: 'plate_chosen', on: day('2026-01-27') },
      ],
    },
  });
  expect(dependenciesOf(built.views, built.view('SURG-01'))).toContainEqual({ key: 'MOLD-06', isMet: false });
});

test('findings that follow from the record are not for a person to state', () => {
  const names = findingNames(builtChild().of.protocol);
  expect(names).toContain('vpi_suspected');
  expect(names).toContain('robin');
  for (const derived of ['lip', 'gum', 'graft_done', 'signed:ORTH-08', 'SURG-03']) expect(names).not.toContain(derived);
});
