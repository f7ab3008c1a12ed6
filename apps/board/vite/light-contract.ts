/**
 * The board calls operations by name, method and path; only a few forms check with a schema before they send. In the
 * built screens an operation is therefore reduced to what a call needs, and a schema that no form asks for leaves the
 * build. What is written in the contract, and its types, stay as they are.
 */
import type { ESTree, Plugin } from 'vite';

/** What the client reads of an operation. */
const kept = new Set(['name', 'method', 'path', 'ifMatch', 'isRepeatable']);
const describesShapes = /\/packages\/(contract|pathway)\/src\/[^?]+\.ts$/;

interface Edit {
  readonly start: number;
  readonly end: number;
  readonly text: string;
}

const constantsOf = (program: ESTree.Program): ESTree.VariableDeclarator[] =>
  program.body.flatMap((statement) => {
    const declared = statement.type === 'ExportNamedDeclaration' ? statement.declaration : statement;
    return declared?.type === 'VariableDeclaration' && declared.kind === 'const' ? declared.declarations : [];
  });

/** The description inside `operation({ … })`. */
const descriptionIn = (value: ESTree.Expression | null): ESTree.ObjectExpression | null => {
  if (value?.type !== 'CallExpression' || value.callee.type !== 'Identifier' || value.callee.name !== 'operation')
    return null;
  const [description] = value.arguments;
  return description?.type === 'ObjectExpression' ? description : null;
};

const spreadIn = (object: ESTree.ObjectExpression): string[] =>
  object.properties.flatMap((one) =>
    one.type === 'SpreadElement' && one.argument.type === 'Identifier' ? [one.argument.name] : [],
  );

/** Every description, and the objects that descriptions are spread from. */
const descriptionsAmong = (constants: readonly ESTree.VariableDeclarator[]): Set<ESTree.ObjectExpression> => {
  const byName = new Map<string, ESTree.ObjectExpression>();
  for (const { id, init } of constants)
    if (id.type === 'Identifier' && init?.type === 'ObjectExpression') byName.set(id.name, init);
  const found = new Set<ESTree.ObjectExpression>();
  const add = (object: ESTree.ObjectExpression): void => {
    found.add(object);
    for (const name of spreadIn(object)) {
      const spread = byName.get(name);
      if (spread !== undefined) add(spread);
    }
  };
  for (const { init } of constants) {
    const description = descriptionIn(init);
    if (description !== null) add(description);
  }
  return found;
};

const lightened = (object: ESTree.ObjectExpression, code: string): string => {
  const stays = object.properties.filter(
    (one) => one.type === 'SpreadElement' || (one.key.type === 'Identifier' && kept.has(one.key.name)),
  );
  return `{ ${stays.map(({ start, end }) => code.slice(start, end)).join(', ')} }`;
};

/** What stands at a name is left out of the build when nobody uses the name. */
const unlessUsed = (value: string): string => `/*#__PURE__*/ (() => (${value}))()`;

export const lightenContract = (code: string, program: ESTree.Program): string => {
  const constants = constantsOf(program);
  const descriptions = descriptionsAmong(constants);
  const edits = constants.flatMap(({ init }): Edit[] => {
    if (init === null) return [];
    const { start, end } = init;
    const description = descriptionIn(init);
    if (description !== null) return [{ start, end, text: lightened(description, code) }];
    if (init.type === 'ObjectExpression' && descriptions.has(init))
      return [{ start, end, text: lightened(init, code) }];
    const makesSomething = init.type === 'CallExpression' || init.type === 'ObjectExpression';
    return makesSomething ? [{ start, end, text: unlessUsed(code.slice(start, end)) }] : [];
  });
  return edits.reduceRight((text, { start, end, text: by }) => text.slice(0, start) + by + text.slice(end), code);
};

export const lightContract = (): Plugin => ({
  name: 'light-contract',
  apply: 'build',
  transform: {
    filter: { id: describesShapes, code: 'zod' },
    handler(code) {
      return { code: lightenContract(code, this.parse(code)), map: null };
    },
  },
});
