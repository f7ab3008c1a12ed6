/** The list of everything that can be asked of the API. */
import * as apiDocument from './api-document.ts';
import * as board from './board.ts';
import * as caseloadImport from './caseload-import.ts';
import * as child from './child.ts';
import * as childHistory from './child-history.ts';
import * as member from './member.ts';
import type { Operation } from './operation.ts';
import * as pathway from './pathway.ts';
import * as pathwayOfChild from './pathway-of-child.ts';
import * as protocol from './protocol.ts';
import * as session from './session.ts';
import * as teamSettings from './team-settings.ts';
import * as trail from './trail.ts';

const isOperation = (value: unknown): value is Operation =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'answer' in value;

const modules: readonly Record<string, unknown>[] = [
  session,
  member,
  teamSettings,
  child,
  childHistory,
  pathway,
  pathwayOfChild,
  board,
  protocol,
  trail,
  caseloadImport,
  apiDocument,
];

export const operations: readonly Operation[] = modules.flatMap((module) => Object.values(module).filter(isOperation));
