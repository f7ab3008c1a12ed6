/** The list of everything the API serves. The server refuses to start when an operation of the contract is missing. */
import { operations } from '@weftway/contract/operations';
import type { AnyEndpoint } from './http/endpoint.ts';
import { apiReferenceEndpoints } from './api-reference/api-reference-endpoints.ts';
import { boardEndpoints } from './board/board-endpoints.ts';
import { childEndpoints } from './children/child-endpoints.ts';
import { importEndpoints } from './imports/import-endpoints.ts';
import { pathwayEndpoints } from './pathways/pathway-endpoints.ts';
import { protocolEndpoints } from './protocol/protocol-endpoints.ts';
import { signInEndpoints } from './sign-in/sign-in-endpoints.ts';
import { teamEndpoints } from './team/team-endpoints.ts';
import { trailEndpoints } from './trail/trail-endpoints.ts';

const served: readonly AnyEndpoint[] = [
  ...signInEndpoints,
  ...teamEndpoints,
  ...childEndpoints,
  ...pathwayEndpoints,
  ...boardEndpoints,
  ...protocolEndpoints,
  ...trailEndpoints,
  ...importEndpoints,
];

export const endpoints: readonly AnyEndpoint[] = [...served, ...apiReferenceEndpoints(served)];

/** Names of contract operations that nobody serves. */
export const missingOperations = (): readonly string[] => {
  const served = new Set(endpoints.map((endpoint) => endpoint.operation.name));
  return operations.map((operation) => operation.name).filter((name) => !served.has(name));
};
