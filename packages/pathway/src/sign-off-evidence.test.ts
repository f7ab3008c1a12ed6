import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { evidenceFault, fieldsOfPart, missingFields, valueFaults } from './sign-off-evidence.ts';
import type { EvidenceField } from './protocol.ts';

const gap: EvidenceField = { name: 'gap', label: 'Gap', kind: 'number', unit: 'mm', min: 0, max: 40, likely: [0, 20] };

describe('a value of a record', () => {
  it('is refused outside the possible range and questioned outside the likely one, bounds included', () => {
    expect(evidenceFault(gap, '-0.1')).toEqual({ kind: 'impossible', message: 'Gap cannot be -0.1 mm.' });
    expect(evidenceFault(gap, '40')).toEqual({
      kind: 'unlikely',
      message: 'Gap of 40 mm is unusual (mostly 0 to 20 mm). Is it right?',
    });
    expect(evidenceFault(gap, '41')?.kind).toBe('impossible');
    expect(evidenceFault(gap, '20')).toBeNull();
    expect(evidenceFault(gap, '0')).toBeNull();
  });

  it('of a number is judged by its range alone', () => {
    fc.assert(
      fc.property(fc.integer({ min: -100, max: 100 }), (value) => {
        const expected = value < 0 || value > 40 ? 'impossible' : value > 20 ? 'unlikely' : undefined;
        expect(evidenceFault(gap, String(value))?.kind).toBe(expected);
      }),
    );
  });

  it.each([
    ['number', 'five', 'Field must be a number.'],
    ['number', '1e3', 'Field must be a number.'],
    ['grade', '1.5', 'Field must be a whole number.'],
    ['yes-no', 'Yes', 'Field must be one of: yes, no.'],
    ['choice', 'c', 'Field must be one of: a, b.'],
    ['date', '2026-02-30', 'Field is not a day of the calendar.'],
    ['date', '0206-02-03', 'Field is not a day of the calendar.'],
    ['root-stage', '4/3', 'Field must be a part of the root, such as 1/2.'],
    ['root-stage', '1/0', 'Field must be a part of the root, such as 1/2.'],
    ['text', 'x'.repeat(301), 'Field is longer than 300 characters.'],
    ['long-text', 'x'.repeat(4001), 'Field is longer than 4000 characters.'],
  ] as const)('of kind %s cannot be %s', (kind, value, message) => {
    expect(evidenceFault({ name: 'f', label: 'Field', kind, choices: ['a', 'b'] }, value)).toEqual({
      kind: 'impossible',
      message,
    });
  });

  it.each([
    ['number', '-1.25'],
    ['grade', '3'],
    ['yes-no', 'no'],
    ['choice', 'a'],
    ['date', '2028-02-29'],
    ['root-stage', '2/3'],
    ['root-stage', '0'],
    ['text', 'ok'],
  ] as const)('of kind %s can be %s', (kind, value) => {
    expect(evidenceFault({ name: 'f', label: 'Field', kind, choices: ['a', 'b'] }, value)).toBeNull();
  });
});

describe('a record', () => {
  it('takes a field that is empty for a reason as present', () => {
    const values = { gap: { value: null, emptyBecause: 'Baby asleep' } };
    expect(missingFields([gap], values)).toEqual([]);
    expect(missingFields([gap], { gap: { value: '  ', emptyBecause: ' ' } })).toEqual([gap]);
    expect(missingFields([gap], {})).toEqual([gap]);
  });

  it('takes an unlikely value once it is confirmed, an impossible one never', () => {
    expect(valueFaults([gap], { gap: { value: '30' } })).toHaveLength(1);
    expect(valueFaults([gap], { gap: { value: '30', isConfirmed: true } })).toEqual([]);
    expect(valueFaults([gap], { gap: { value: '300', isConfirmed: true } })).toHaveLength(1);
    expect(valueFaults([gap], { gap: { value: null, emptyBecause: 'x' } })).toEqual([]);
  });

  it('of two signatures is split between them without a rest', () => {
    for (const rule of defaultProtocol.milestones) {
      const parts = rule.signatures.flatMap((signature) => fieldsOfPart(rule, signature.part));
      expect(new Set(parts)).toEqual(new Set(rule.evidence));
      expect(parts).toHaveLength(rule.evidence.length);
    }
  });

  it('is asked of every milestone and every signature', () => {
    for (const rule of defaultProtocol.milestones) {
      for (const { part } of rule.signatures)
        expect(fieldsOfPart(rule, part).length, `${rule.id} ${part}`).toBeGreaterThan(0);
    }
  });
});
