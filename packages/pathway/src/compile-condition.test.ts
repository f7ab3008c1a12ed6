import { describe, expect, it } from 'vitest';
import { compileCondition, type FactNames } from './compile-condition.ts';
import type { Condition } from './condition.ts';

function holds(
  condition: Condition,
  facts: readonly string[],
  options: Parameters<typeof compileCondition>[2] = {},
): boolean {
  const names: FactNames = new Map();
  const test = compileCondition(condition, names, options);
  const truth = new Uint8Array(names.size);
  for (const fact of facts) {
    const number = names.get(fact);
    if (number !== undefined) truth[number] = 1;
  }
  return test(truth);
}

describe('a condition over recorded facts', () => {
  it.each<[Condition, readonly string[], boolean]>([
    ['lip', ['lip'], true],
    ['lip', [], false],
    [{ all: ['lip', 'gum'] }, ['lip'], false],
    [{ all: ['lip', 'gum'] }, ['lip', 'gum'], true],
    [{ any: ['lip', 'gum'] }, ['gum'], true],
    [{ any: ['lip', 'gum'] }, ['palate'], false],
    [{ not: 'lip' }, [], true],
    [{ all: ['palate', { not: { any: ['lip', 'robin'] } }] }, ['palate', 'robin'], false],
  ])('%j with %j: %s', (condition, facts, expected) => {
    expect(holds(condition, facts)).toBe(expected);
  });
});

describe('conditions taken as given', () => {
  const given = { given: true };

  it('hold unless they are anatomy or a finding', () => {
    expect([holds('plate_chosen', [], given), holds('palate', [], given), holds('vpi_suspected', [], given)]).toEqual([
      true,
      false,
      false,
    ]);
  });

  it('hold as an alternative to anatomy too, for they are neither anatomy nor a finding', () => {
    expect(holds({ any: ['palate', 'screen_failed'] }, [], given)).toBe(true);
    expect(holds({ any: ['palate', 'smcp'] }, [], given)).toBe(false);
    expect(holds({ all: [{ any: ['gum', 'palate'] }, 'treatment_need'] }, ['gum'], given)).toBe(true);
  });

  it('are never the denied ones', () => {
    expect(holds({ not: 'plate_chosen' }, [], given)).toBe(true);
  });
});

it('a name that is ruled out is false whatever is recorded', () => {
  expect(holds({ not: 'signed:MOLD-06' }, ['signed:MOLD-06'], { never: ['signed:MOLD-06'] })).toBe(true);
});
