import { expect, test } from 'vitest';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { faultsByPlace, takenBack, withValue } from '../proposal/draft-protocol.ts';
import { protocolChanges } from './protocol-changes.ts';

const changed = (id: string, change: (rule: MilestoneRule) => MilestoneRule): Protocol => ({
  ...defaultProtocol,
  milestones: defaultProtocol.milestones.map((rule) => (rule.id === id ? change(rule) : rule)),
});

test('a version does not differ from itself, also after a trip through JSON', () => {
  expect(protocolChanges(defaultProtocol, JSON.parse(JSON.stringify(defaultProtocol)) as Protocol)).toEqual([]);
});

test('a moved window, a gap and a record field are told in words', () => {
  const to = changed('SURG-03', (rule) => ({
    ...rule,
    window: { ...rule.window, target: '10m' },
    prerequisites: rule.prerequisites.map((need) => (need.milestone === 'SURG-01' ? { ...need, gap: '16w' } : need)),
    evidence: rule.evidence.filter((field) => field.name !== 'technique'),
  }));
  expect(protocolChanges(defaultProtocol, to)).toEqual([
    {
      id: 'SURG-03',
      title: 'Palate repair',
      kind: 'changed',
      parts: [
        { label: 'Aim', before: ['11 months'], after: ['10 months'] },
        {
          label: 'Must be done first',
          before: ['Lip repair, then 12 weeks to pass, only with cleft of the lip'],
          after: ['Lip repair, then 16 weeks to pass, only with cleft of the lip'],
        },
        { label: 'Record before signing', before: ['Technique'], after: [] },
      ],
    },
  ]);
});

test('settings, added and removed milestones are told', () => {
  const to: Protocol = {
    ...defaultProtocol,
    settings: { ...defaultProtocol.settings, graftRootLower: '1/4' },
    milestones: defaultProtocol.milestones.slice(1),
  };
  expect(protocolChanges(defaultProtocol, to).map(({ id, kind }) => [id, kind])).toEqual([
    [null, 'changed'],
    ['TEAM-01', 'removed'],
  ]);
  expect(protocolChanges(to, defaultProtocol).at(-1)).toMatchObject({ id: 'TEAM-01', kind: 'added' });
});

test('one value is changed without touching the rest, and taken back', () => {
  const at = defaultProtocol.milestones.findIndex((rule) => rule.id === 'SURG-01');
  const draft = withValue(defaultProtocol, ['milestones', at, 'window', 'latest'], '7m');
  expect(draft.milestones[at]?.window).toEqual({ earliest: '10w', target: '3m', latest: '7m' });
  expect(draft.milestones[at + 1]).toBe(defaultProtocol.milestones[at + 1]);
  expect(protocolChanges(defaultProtocol, takenBack(draft, defaultProtocol, 'SURG-01'))).toEqual([]);
  const ungapped = withValue(draft, ['milestones', at, 'prerequisites', 0, 'gap'], undefined);
  expect(ungapped.milestones[at]?.prerequisites[0]).not.toHaveProperty('gap');
});

test('a fault of a window stands at the date that is meant', () => {
  const faults = faultsByPlace([
    { pointer: '/milestones/3/window', message: 'The target 1m comes before the earliest day 2m.' },
    { pointer: '/milestones/4/variants/0/window', message: 'The latest day 1m comes before the target 2m.' },
    { pointer: '/milestones/5/window', message: 'Closing takes 15 days, but the window can be as short as 14 days.' },
  ]);
  expect([...faults.keys()]).toEqual([
    '/milestones/3/window/target',
    '/milestones/4/variants/0/window/latest',
    '/milestones/5/closingDays',
  ]);
});
