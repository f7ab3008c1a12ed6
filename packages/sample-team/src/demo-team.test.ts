import { beforeAll, expect, test } from 'vitest';
import { plainDate } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { demoChildren } from './demo-team.ts';
import { membersWith } from './members.ts';
import type { SampleChild } from './sample-acts.ts';

const today = plainDate('2026-12-01');
let children: readonly SampleChild[] = [];

beforeAll(() => {
  children = demoChildren(defaultProtocol, today);
}, 60_000);

test('the demo has about 160 children of all ages, some not born yet', () => {
  const births = children.map((child) => (child.acts[0]?.kind === 'register' ? child.acts[0].fields.bornOn : null));
  expect(children.length).toBeGreaterThanOrEqual(150);
  expect(births.filter((born) => born === null)).toHaveLength(4);
  expect(births.some((born) => born !== null && born < '2009-01-01')).toBe(true);
  expect(births.some((born) => born !== null && born > '2026-11-01')).toBe(true);
});

test('the same day gives the same demo', () => {
  expect(demoChildren(defaultProtocol, today).slice(0, 20)).toEqual(children.slice(0, 20));
}, 60_000);

test('nothing is recorded before a child is registered, and nothing after today', () => {
  for (const child of children) {
    const [first, ...later] = child.acts;
    expect(first?.kind).toBe('register');
    for (const act of later) {
      expect(act.at >= (first?.at ?? ''), child.id).toBe(true);
      if (act.kind === 'sign') expect(act.performedOn <= today, `${child.id} ${act.milestone}`).toBe(true);
    }
  }
});

test('every signature is given by somebody whose discipline may give it', () => {
  const rules = new Map(defaultProtocol.milestones.map((rule) => [rule.id, rule]));
  for (const child of children) {
    for (const act of child.acts) {
      if (act.kind !== 'sign') continue;
      const part = rules.get(act.milestone.split(':')[0] ?? '')?.signatures.find((one) => one.part === act.part);
      const wanted = part?.disciplines ?? [];
      if (wanted.includes('lead-clinician')) continue;
      const able = [...membersWith(wanted, 0), ...membersWith(wanted, 5000)].map((member) => member.id);
      expect(able, `${child.id} ${act.milestone}`).toContain(act.signerId);
    }
  }
});

test('every kind of act happens somewhere', () => {
  const kinds = new Set(children.flatMap((child) => child.acts.map((act) => act.kind)));
  for (const kind of [
    'register',
    'assign',
    'claim',
    'sign',
    'draft',
    'hold',
    'waive',
    'book',
    'import',
    'transfer',
    'own',
  ] as const)
    expect(kinds).toContain(kind);
});
