/** The occurrence of a repeating milestone that is awaited, and what has happened before it. */
import type { PastOccurrence } from './planning.ts';
import type { FirstWindow } from './window.ts';
import type { WindowDraft } from './window-draft.ts';

export interface Happening {
  readonly on: number;
  readonly kind: 'signed' | 'waived';
}

export interface Awaited {
  readonly first: FirstWindow;
  readonly draft: WindowDraft;
  readonly occurrence: number;
  /** No further occurrence is due. */
  readonly isFinished: boolean;
  readonly lastKind: 'signed' | 'waived' | null;
  readonly past: readonly PastOccurrence[];
}

/** A later occurrence with nothing amiss. */
export const laidOccurrence: FirstWindow = { offPath: null, missing: null, isUnverified: false };
