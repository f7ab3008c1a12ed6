/** Everything that can be asked about children's records. */
import type { AnyEndpoint } from '../http/endpoint.ts';
import { assignTraineesEndpoint } from './assign-trainees.ts';
import { editChildEndpoint } from './edit-child.ts';
import { endCareEndpoint } from './end-care.ts';
import { findDuplicatesEndpoint } from './find-duplicates.ts';
import { listChildChangesEndpoint } from './list-child-changes.ts';
import { listChildrenEndpoint } from './list-children.ts';
import { readChildEndpoint } from './read-child.ts';
import { readRecordChoicesEndpoint } from './read-record-choices.ts';
import { registerChildEndpoint } from './register-child.ts';
import { transferChildEndpoint } from './transfer-child.ts';

export const childEndpoints: readonly AnyEndpoint[] = [
  listChildrenEndpoint,
  findDuplicatesEndpoint,
  registerChildEndpoint,
  readChildEndpoint,
  listChildChangesEndpoint,
  readRecordChoicesEndpoint,
  editChildEndpoint,
  transferChildEndpoint,
  endCareEndpoint,
  assignTraineesEndpoint,
];
