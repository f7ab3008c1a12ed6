/** The description of the API itself, made from the contract (OpenAPI 3.1). */
import { z } from 'zod';
import { operation } from './operation.ts';
import { noneSchema } from './text-fields.ts';

const schemaObject = z.record(z.string(), z.unknown());
const mediaSchema = z.record(z.string(), z.object({ schema: schemaObject }));

export const apiParameterSchema = z.object({
  name: z.string(),
  in: z.enum(['path', 'query', 'header']),
  required: z.boolean(),
  description: z.string().optional(),
  schema: schemaObject,
});
export const apiResponseSchema = z.object({ description: z.string(), content: mediaSchema.optional() });
export const apiOperationSchema = z.object({
  operationId: z.string(),
  summary: z.string(),
  tags: z.array(z.string()),
  parameters: z.array(apiParameterSchema),
  requestBody: z.object({ required: z.boolean(), content: mediaSchema }).optional(),
  responses: z.record(z.string(), apiResponseSchema),
  /** Anyone, everyone who is signed in, or a line of the permission table. */
  'x-who-may': z.union([
    z.literal('anyone'),
    z.literal('signed-in'),
    z.object({ action: z.string(), subject: z.string() }),
  ]),
  /** Names of the problems it can answer with. */
  'x-problems': z.array(z.string()),
});
export type ApiOperation = z.infer<typeof apiOperationSchema>;

export const apiDocumentSchema = z.object({
  openapi: z.literal('3.1.0'),
  info: z.object({ title: z.string(), version: z.string(), description: z.string() }),
  servers: z.array(z.object({ url: z.string() })),
  tags: z.array(z.object({ name: z.string() })),
  paths: z.record(z.string(), z.record(z.string(), apiOperationSchema)),
  components: z.object({
    schemas: z.record(z.string(), schemaObject),
    securitySchemes: z.record(z.string(), schemaObject),
  }),
  security: z.array(z.record(z.string(), z.array(z.string()))),
});
export type ApiDocument = z.infer<typeof apiDocumentSchema>;

export const readApiDocument = operation({
  name: 'readApiDocument',
  group: 'API reference',
  summary: 'This description, as OpenAPI 3.1',
  method: 'GET',
  path: '/openapi.json',
  params: noneSchema,
  query: noneSchema,
  body: noneSchema,
  answer: apiDocumentSchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
  ifMatch: 'none',
  isRepeatable: false,
});
