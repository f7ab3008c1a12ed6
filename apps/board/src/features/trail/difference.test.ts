import { expect, test } from 'vitest';
import { differenceRows } from './difference.ts';

const nameOf = (id: string) => (id === 'm-ines' ? 'Ines Calder' : undefined);

test('only what differs is told, in words', () => {
  const before = {
    fields: {
      firstName: 'Mara',
      bornOn: '2026-10-06',
      isBirthEstimated: false,
      leadClinicianId: null,
      contacts: [{ name: 'Ada', phone: '1' }],
    },
  };
  const after = {
    fields: {
      firstName: 'Mara',
      bornOn: '2026-10-07',
      isBirthEstimated: true,
      leadClinicianId: 'm-ines',
      contacts: [{ name: 'Ada', phone: '2' }],
    },
  };
  expect(differenceRows(before, after, nameOf)).toEqual([
    { label: 'Born on', before: '6 Oct 2026', after: '7 Oct 2026' },
    { label: 'Birth date is an estimate', before: 'no', after: 'yes' },
    { label: 'Lead clinician', before: 'nothing', after: 'Ines Calder' },
    { label: 'Contacts, 1, Phone', before: '1', after: '2' },
  ]);
});

test('a line without a before tells what it wrote, without ids and digests', () => {
  const after = {
    previousDigest: '00',
    draftedById: null,
    signature: {
      id: 'x',
      digest: 'ff',
      signerName: 'Ines Calder',
      performedOn: '2026-11-30',
      values: { gap_mm: { value: '6.2' }, note: { value: null, emptyBecause: 'Not asked' } },
    },
  };
  expect(differenceRows(null, after, nameOf)).toEqual([
    { label: 'Signed by', before: null, after: 'Ines Calder' },
    { label: 'Done on', before: null, after: '30 Nov 2026' },
    { label: 'Gap mm', before: null, after: '6.2' },
    { label: 'Note', before: null, after: 'nothing, left empty because Not asked' },
  ]);
});

test('a line with nothing in it has no rows', () => {
  expect(differenceRows(null, {}, nameOf)).toEqual([]);
  expect(differenceRows({ version: 1 }, { version: 1 }, nameOf)).toEqual([]);
});
