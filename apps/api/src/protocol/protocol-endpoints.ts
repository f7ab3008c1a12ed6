import type { AnyEndpoint } from '../http/endpoint.ts';
import { activateProtocolEndpoint } from './activate-protocol.ts';
import { addProtocolEndpoint } from './add-protocol.ts';
import { checkProtocolEndpoint } from './check-protocol.ts';
import { listProtocolsEndpoint } from './list-protocols.ts';
import { readProtocolVersionEndpoint } from './read-protocol-version.ts';

export const protocolEndpoints: readonly AnyEndpoint[] = [
  listProtocolsEndpoint,
  readProtocolVersionEndpoint,
  checkProtocolEndpoint,
  addProtocolEndpoint,
  activateProtocolEndpoint,
];
