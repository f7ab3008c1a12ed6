import { expect, test } from 'vitest';
import { fieldRows, schemaWords } from './schema-words.ts';

test('a schema is told in words', () => {
  expect(schemaWords({ type: 'string', maxLength: 80 })).toBe('text, up to 80 characters');
  expect(schemaWords({ type: 'string', format: 'date', pattern: 'x' })).toBe('date, 2026-10-06');
  expect(schemaWords({ enum: ['a', 'b'] })).toBe('one of a, b');
  expect(schemaWords({ anyOf: [{ type: 'string' }, { type: 'null' }] })).toBe('text, or null');
  expect(schemaWords({ type: 'array', items: { type: 'integer', minimum: 0 }, maxItems: 3 })).toBe(
    'list of whole number, at least 0, at most 3',
  );
  expect(schemaWords({ type: ['string', 'null'] })).toBe('text, or null');
  expect(schemaWords({})).toBe('anything');
});

test('fields inside lists and objects have their path, and a default makes a field optional', () => {
  const rows = fieldRows({
    type: 'object',
    required: ['limit', 'contacts'],
    properties: {
      limit: { type: 'integer', default: 50 },
      contacts: {
        type: 'array',
        items: { type: 'object', required: ['name'], properties: { name: { type: 'string' } } },
      },
    },
  });
  expect(rows).toEqual([
    { name: 'limit', what: 'whole number', isRequired: false },
    { name: 'contacts', what: 'list of object', isRequired: true },
    { name: 'contacts[].name', what: 'text', isRequired: true },
  ]);
});
