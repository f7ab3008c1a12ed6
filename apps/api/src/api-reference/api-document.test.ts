import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { ApiDocument, ApiOperation } from '@weftway/contract/api-document';
import { operations } from '@weftway/contract/operations';
import { problems } from '@weftway/contract/problems';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { openApiPath } from './api-document.ts';

let app: TestApp;
let document: ApiDocument;

beforeAll(async () => {
  app = await createTestApp();
  const answer = await (await app.as('administrator')).get('/openapi.json');
  expect(answer.status).toBe(200);
  document = answer.body as ApiDocument; // what the operation promises
});
afterAll(async () => app.close());

const described = (): { path: string; method: string; operation: ApiOperation }[] =>
  Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, operation]) => ({ path, method, operation })),
  );

/** Every word that JSON Schema 2020-12 knows and that we use. */
const schemaWords = new Set([
  '$ref',
  '$defs',
  'id',
  'type',
  'properties',
  'required',
  'additionalProperties',
  'propertyNames',
  'items',
  'prefixItems',
  'minItems',
  'maxItems',
  'enum',
  'const',
  'anyOf',
  'oneOf',
  'allOf',
  'not',
  'format',
  'pattern',
  'minLength',
  'maxLength',
  'minimum',
  'maximum',
  'exclusiveMinimum',
  'exclusiveMaximum',
  'multipleOf',
  'default',
  'description',
  'title',
]);
const schemaTypes = ['object', 'array', 'string', 'number', 'integer', 'boolean', 'null'];

/** Faults of a JSON schema, each with its place. */
const schemaFaults = (schema: unknown, at: string, root: unknown = schema): string[] => {
  if (typeof schema === 'boolean') return [];
  if (typeof schema !== 'object' || schema === null || Array.isArray(schema)) return [`${at}: not a schema`];
  return Object.entries(schema).flatMap(([word, value]): string[] => {
    const here = `${at}/${word}`;
    if (!schemaWords.has(word)) return [`${here}: not a word of JSON Schema`];
    if (word === 'type')
      return [value].flat().every((one) => schemaTypes.includes(String(one)))
        ? []
        : [`${here}: ${String(value)} is not a type`];
    if (word === 'pattern')
      return [() => new RegExp(String(value), 'u')].flatMap((make) => {
        try {
          make();
          return [];
        } catch {
          return [`${here}: not a pattern`];
        }
      });
    if (word === 'properties' || word === '$defs')
      return Object.entries(value as object).flatMap(([name, inner]) => schemaFaults(inner, `${here}/${name}`, root));
    if (['items', 'additionalProperties', 'propertyNames', 'not'].includes(word))
      return schemaFaults(value, here, root);
    if (['anyOf', 'oneOf', 'allOf', 'prefixItems'].includes(word))
      return (value as unknown[]).flatMap((inner, index) => schemaFaults(inner, `${here}/${index}`, root));
    if (word === '$ref') return resolves(String(value), root) ? [] : [`${here}: ${String(value)} leads nowhere`];
    return [];
  });
};

const resolves = (reference: string, root: unknown): boolean => {
  const from = reference.startsWith('#/components/') ? document : root;
  const found = reference
    .replace(/^#\/?/, '')
    .split('/')
    .filter((step) => step !== '')
    .reduce<unknown>((value, step) => (value as Record<string, unknown> | undefined)?.[step], from);
  return found !== undefined;
};

describe('the description of the API', () => {
  test('is for administrators alone', async () => {
    expect((await (await app.as('surgeon')).get('/openapi.json')).status).toBe(403);
    expect((await (await app.as('coordinator')).get('/openapi.json')).status).toBe(403);
  });

  test('describes every operation of the contract once, under its method and path', () => {
    expect(
      described()
        .map(({ operation }) => operation.operationId)
        .sort(),
    ).toEqual(operations.map(({ name }) => name).sort());
    for (const operation of operations)
      expect(document.paths[openApiPath(operation.path)]?.[operation.method.toLowerCase()]?.operationId).toBe(
        operation.name,
      );
  });

  test('has the members that OpenAPI 3.1 asks for', () => {
    expect(document.openapi).toBe('3.1.0');
    expect(document.info).toMatchObject({ title: 'Weftway', version: '1' });
    expect(document.servers).toEqual([{ url: '/api/v1' }]);
    for (const path of Object.keys(document.paths)) expect(path).toMatch(/^\/[a-z0-9\-./{}A-Za-z]*$/);
    for (const { method } of described()) expect(['get', 'put', 'post', 'delete', 'patch']).toContain(method);
    expect(Object.keys(document.components.securitySchemes)).toEqual(Object.keys(document.security[0] ?? {}));
  });

  test('declares each part of a path exactly once, and nothing else in it', () => {
    for (const { path, operation } of described()) {
      const inPath = [...path.matchAll(/\{([^}]+)\}/g)].map((match) => match[1]);
      const declared = operation.parameters.filter((one) => one.in === 'path');
      expect(declared.map((one) => one.name).sort(), operation.operationId).toEqual(inPath.sort());
      expect(declared.every((one) => one.required)).toBe(true);
      const names = operation.parameters.map((one) => `${one.in} ${one.name}`);
      expect(new Set(names).size, operation.operationId).toBe(names.length);
    }
  });

  test('answers every operation with a success and its problems, each under its status', () => {
    const tags = document.tags.map(({ name }) => name);
    for (const { method, operation } of described()) {
      const statuses = Object.keys(operation.responses);
      expect(
        statuses.every((status) => /^[1-5]\d\d$/.test(status)),
        operation.operationId,
      ).toBe(true);
      expect(
        statuses.filter((status) => status.startsWith('2')),
        operation.operationId,
      ).toHaveLength(1);
      for (const name of operation['x-problems'])
        expect(statuses, `${operation.operationId} ${name}`).toContain(
          String(problems[name as keyof typeof problems].status),
        );
      expect(operation.tags.every((tag) => tags.includes(tag))).toBe(true);
      if (method === 'get') expect(operation.requestBody, operation.operationId).toBeUndefined();
    }
  });

  test('holds only schemas that JSON Schema 2020-12 allows, with every reference leading somewhere', () => {
    const schemas = [
      ...Object.entries(document.components.schemas),
      ...described().flatMap(({ operation }) => [
        ...operation.parameters.map((one) => [`${operation.operationId}/${one.name}`, one.schema] as const),
        ...Object.values(operation.requestBody?.content ?? {}).map(
          ({ schema }) => [`${operation.operationId}/body`, schema] as const,
        ),
        ...Object.entries(operation.responses).flatMap(([status, response]) =>
          Object.values(response.content ?? {}).map(
            ({ schema }) => [`${operation.operationId}/${status}`, schema] as const,
          ),
        ),
      ]),
    ];
    expect(schemas.length).toBeGreaterThan(200);
    expect(schemas.flatMap(([name, schema]) => schemaFaults(schema, name))).toEqual([]);
  });

  test('says who may call what, in the words of the permission table', () => {
    expect(document.paths['/children/{childId}/milestones/{milestone}/sign-off']?.['post']?.['x-who-may']).toEqual({
      action: 'sign',
      subject: 'Milestone',
    });
    expect(document.paths['/session']?.['post']?.['x-who-may']).toBe('anyone');
    expect(document.paths['/openapi.json']?.['get']?.['x-who-may']).toEqual({
      action: 'read',
      subject: 'ApiReference',
    });
  });

  test('a text with a date format stands where a date is sent', () => {
    const body =
      document.paths['/members/{memberId}/cover']?.['put']?.requestBody ??
      document.paths['/children/{childId}/findings']?.['post']?.requestBody;
    expect(JSON.stringify(body)).toContain('"format":"date"');
  });
});
