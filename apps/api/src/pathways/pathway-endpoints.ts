import type { AnyEndpoint } from '../http/endpoint.ts';
import { addOwnMilestoneEndpoint } from './add-own-milestone.ts';
import { amendSignatureEndpoint } from './amend-signature.ts';
import { askWhatIfEndpoint } from './ask-what-if.ts';
import { bookMilestoneEndpoint } from './book-milestone.ts';
import { claimMilestoneEndpoint } from './claim-milestone.ts';
import { confirmImportedEndpoint } from './confirm-imported.ts';
import { handOverMilestoneEndpoint } from './hand-over-milestone.ts';
import { holdMilestoneEndpoint } from './hold-milestone.ts';
import { moveToProtocolEndpoint } from './move-to-protocol.ts';
import { readPathwayEndpoint } from './read-pathway.ts';
import { readSigningSheetEndpoint } from './read-signing-sheet.ts';
import { recordFindingEndpoint } from './record-finding.ts';
import { releaseMilestoneEndpoint } from './release-milestone.ts';
import { saveDraftEndpoint } from './save-draft.ts';
import { signMilestoneEndpoint } from './sign-milestone.ts';
import { waiveMilestoneEndpoint } from './waive-milestone.ts';

export const pathwayEndpoints: readonly AnyEndpoint[] = [
  readPathwayEndpoint,
  claimMilestoneEndpoint,
  releaseMilestoneEndpoint,
  handOverMilestoneEndpoint,
  saveDraftEndpoint,
  readSigningSheetEndpoint,
  signMilestoneEndpoint,
  amendSignatureEndpoint,
  holdMilestoneEndpoint,
  waiveMilestoneEndpoint,
  bookMilestoneEndpoint,
  confirmImportedEndpoint,
  recordFindingEndpoint,
  addOwnMilestoneEndpoint,
  askWhatIfEndpoint,
  moveToProtocolEndpoint,
];
