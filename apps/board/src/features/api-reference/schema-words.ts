/** A JSON schema told in words, and as rows: one for each field. */
import { apiReferenceWords as words } from '../../words/api-reference.ts';

export type Schema = Readonly<Record<string, unknown>>;

export interface FieldRow {
  /** `contacts[].phone` */
  readonly name: string;
  readonly what: string;
  readonly isRequired: boolean;
}

const isSchema = (value: unknown): value is Schema =>
  typeof value === 'object' && value !== null && !Array.isArray(value);
const schemasIn = (value: unknown): Schema[] => (Array.isArray(value) ? value.filter(isSchema) : []);
const textsIn = (value: unknown): string[] => (Array.isArray(value) ? value.map(String) : []);

const limits = (schema: Schema): string[] => {
  const { maxLength, minimum, maximum, maxItems } = schema;
  return [
    ...(typeof maxLength === 'number' ? [words.upTo(maxLength)] : []),
    ...(typeof minimum === 'number' && minimum > -1e15 ? [words.atLeast(minimum)] : []),
    ...(typeof maximum === 'number' && maximum < 1e15 ? [words.atMost(maximum)] : []),
    ...(typeof maxItems === 'number' ? [words.atMost(maxItems)] : []),
  ];
};

const kindOf = (schema: Schema): string => {
  const { type, format } = schema;
  if (typeof format === 'string' && words.formats[format] !== undefined) return words.formats[format];
  if (Array.isArray(type)) return words.either(type.map((one) => words.types[String(one)] ?? words.anything));
  return words.types[String(type)] ?? words.anything;
};

/** "text, up to 80 characters" */
export const schemaWords = (schema: Schema): string => {
  const choices = [...schemasIn(schema['anyOf']), ...schemasIn(schema['oneOf'])];
  if (choices.length > 0) return words.either([...new Set(choices.map(schemaWords))]);
  if (Array.isArray(schema['enum'])) return words.oneOf(textsIn(schema['enum']));
  if ('const' in schema) return words.exactly(JSON.stringify(schema['const']));
  if (schema['type'] === 'array')
    return [
      words.listOf(isSchema(schema['items']) ? schemaWords(schema['items']) : words.anything),
      ...limits(schema),
    ].join(', ');
  return [kindOf(schema), ...limits(schema)].join(', ');
};

const deepest = 4;

/** Fields of an object and of the objects inside it. */
export const fieldRows = (schema: Schema, before = '', depth = 0): FieldRow[] => {
  if (depth > deepest) return [];
  const properties = isSchema(schema['properties']) ? schema['properties'] : {};
  const required = textsIn(schema['required']);
  const own = Object.entries(properties).flatMap(([name, value]): FieldRow[] => {
    if (!isSchema(value)) return [];
    const full = before === '' ? name : `${before}.${name}`;
    const row = {
      name: full,
      what: schemaWords(value),
      isRequired: required.includes(name) && value['default'] === undefined,
    };
    const inner =
      value['type'] === 'array' && isSchema(value['items'])
        ? fieldRows(value['items'], `${full}[]`, depth + 1)
        : fieldRows(value, full, depth + 1);
    return [row, ...inner];
  });
  const choices = [...schemasIn(schema['anyOf']), ...schemasIn(schema['oneOf']), ...schemasIn(schema['allOf'])];
  const seen = new Set(own.map((row) => row.name));
  return [
    ...own,
    ...choices
      .flatMap((choice) => fieldRows(choice, before, depth + 1))
      .filter((row) => !seen.has(row.name) && seen.add(row.name)),
  ];
};
