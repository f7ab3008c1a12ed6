/** The API described as OpenAPI 3.1, made from the contract and from who may call what; nothing is written by hand. */
import { z } from 'zod';
import type { ApiDocument, ApiOperation } from '@weftway/contract/api-document';
import { apiPrefix } from '@weftway/contract/operation';
import type { Operation } from '@weftway/contract/operation';
import { problemSchema, problems } from '@weftway/contract/problems';
import type { ProblemName } from '@weftway/contract/problems';
import type { AnyEndpoint } from '../http/endpoint.ts';

type Schema = Record<string, unknown>;

const problemRef = { $ref: '#/components/schemas/Problem' };

/** What is sent, and what is answered, before any transform: dates are text with a format. Rules that only code can say are left out. */
export const jsonSchemaOf = (schema: z.ZodType): Schema => {
  const { $schema: _dialect, ...made } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' });
  return made as Schema; // plain JSON by its making
};

const propertiesOf = (schema: Schema): [string, Schema][] =>
  Object.entries((schema['properties'] ?? {}) as Record<string, Schema>); // JSON Schema

const isEmptyObject = (schema: Schema): boolean =>
  propertiesOf(schema).length === 0 && schema['type'] === 'object' && schema['additionalProperties'] === false;

/** `/children/:childId` as `/children/{childId}`. */
export const openApiPath = (path: string): string => path.replaceAll(/:([A-Za-z]+)/g, '{$1}');

const parametersOf = (operation: Operation): ApiOperation['parameters'] => {
  const params = jsonSchemaOf(operation.params);
  const query = jsonSchemaOf(operation.query);
  const needed = (query['required'] ?? []) as readonly string[]; // JSON Schema
  return [
    ...propertiesOf(params).map(([name, schema]) => ({ name, in: 'path' as const, required: true, schema })),
    // A value with a default may be left out, whatever the schema says of what comes out.
    ...propertiesOf(query).map(([name, schema]) => ({
      name,
      in: 'query' as const,
      required: needed.includes(name) && schema['default'] === undefined,
      schema,
    })),
    ...(operation.ifMatch === 'required'
      ? [
          {
            name: 'If-Match',
            in: 'header' as const,
            required: true,
            description: 'The version that was read, in quotes: "12".',
            schema: { type: 'string' },
          },
        ]
      : []),
    ...(operation.isRepeatable
      ? [
          {
            name: 'Idempotency-Key',
            in: 'header' as const,
            required: false,
            description: 'The same key for every try of one intent; the answer of the first is given again.',
            schema: { type: 'string', minLength: 8, maxLength: 100 },
          },
        ]
      : []),
    ...(operation.method === 'GET'
      ? []
      : [
          {
            name: 'x-csrf-token',
            in: 'header' as const,
            required: true,
            description: 'The csrfToken that readSession answers.',
            schema: { type: 'string' },
          },
        ]),
  ];
};

/** Problems that any call may meet, whatever the operation lists. */
const always: readonly ProblemName[] = ['surprise', 'too-many'];

const problemsOf = (operation: Operation): ProblemName[] => {
  const sent: readonly ProblemName[] =
    operation.method === 'GET' ? [] : ['bad-input', 'wrong-type', 'too-large', 'forged-request'];
  const repeated: readonly ProblemName[] = operation.isRepeatable ? ['same-key-other-body'] : [];
  return [...new Set([...operation.problems, ...sent, ...repeated, ...always])];
};

const responsesOf = (operation: Operation): ApiOperation['responses'] => {
  const byStatus = new Map<number, ProblemName[]>();
  for (const name of problemsOf(operation)) {
    const { status } = problems[name];
    byStatus.set(status, [...(byStatus.get(status) ?? []), name]);
  }
  return {
    [operation.status]: {
      description: operation.summary,
      content: { 'application/json': { schema: jsonSchemaOf(operation.answer) } },
    },
    ...Object.fromEntries(
      [...byStatus]
        .sort(([a], [b]) => a - b)
        .map(([status, names]) => [
          String(status),
          {
            description: names.map((name) => `${problems[name].title} (${name}).`).join(' '),
            content: { 'application/problem+json': { schema: problemRef } },
          },
        ]),
    ),
  };
};

const operationOf = ({ operation, can }: AnyEndpoint): ApiOperation => {
  const body = jsonSchemaOf(operation.body);
  return {
    operationId: operation.name,
    summary: operation.summary,
    tags: [operation.group],
    parameters: parametersOf(operation),
    ...(operation.method === 'GET' || isEmptyObject(body)
      ? {}
      : { requestBody: { required: true, content: { 'application/json': { schema: body } } } }),
    responses: responsesOf(operation),
    'x-who-may': can,
    'x-problems': problemsOf(operation),
  };
};

const pathsOf = (endpoints: readonly AnyEndpoint[]): ApiDocument['paths'] => {
  const paths: ApiDocument['paths'] = {};
  for (const endpoint of endpoints) {
    const path = openApiPath(endpoint.operation.path);
    paths[path] = { ...paths[path], [endpoint.operation.method.toLowerCase()]: operationOf(endpoint) };
  }
  return paths;
};

export const apiDocumentOf = (endpoints: readonly AnyEndpoint[]): ApiDocument => ({
  openapi: '3.1.0',
  info: {
    title: 'Weftway',
    version: '1',
    description: 'The API of the board of a cleft lip and palate team. Every failure is a problem document (RFC 9457).',
  },
  servers: [{ url: apiPrefix }],
  tags: [...new Set(endpoints.map((endpoint) => endpoint.operation.group))].map((name) => ({ name })),
  paths: pathsOf(endpoints),
  components: {
    schemas: { Problem: jsonSchemaOf(problemSchema) },
    securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: '__Host-wid', description: 'Set by signIn.' } },
  },
  security: [{ session: [] }],
});
