/**
 * The recurrence library, imported so that it works alike under Node, vitest and vite.
 * Node sees its CommonJS build (names under `default`), vite its ES module (names at the top).
 */
import * as imported from 'rrule';

type RruleLibrary = typeof import('rrule');

// The compiler sees the ES module only; under Node the names hang on `default`.
const inner = (imported as unknown as { readonly default?: RruleLibrary }).default;
export const { RRule, RRuleSet, rrulestr }: RruleLibrary = inner?.RRule ? inner : (imported as RruleLibrary);
