import type { AnyEndpoint } from '../http/endpoint.ts';
import { readBoardEndpoint } from './read-board.ts';
import { readBoardChangesEndpoint } from './read-board-changes.ts';
import { readMyWorkEndpoint } from './read-my-work.ts';

export const boardEndpoints: readonly AnyEndpoint[] = [readBoardEndpoint, readBoardChangesEndpoint, readMyWorkEndpoint];
