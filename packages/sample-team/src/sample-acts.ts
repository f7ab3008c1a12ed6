/** What happened to a sample child, in a form that knows neither database nor server. */
import type { ChildFields } from '@weftway/contract/child';
import type { Evidence } from '@weftway/contract/pathway';
import type { Finding } from '@weftway/pathway/pathway-facts';
import type { MilestoneRule } from '@weftway/pathway/protocol';

interface At {
  /** UTC instant. */
  readonly at: string;
  readonly byId: string;
}

export type SampleAct = At &
  (
    | { readonly kind: 'register'; readonly fields: ChildFields }
    | { readonly kind: 'assign'; readonly memberIds: readonly string[] }
    | { readonly kind: 'claim'; readonly milestone: string; readonly part: string; readonly memberId: string }
    | {
        readonly kind: 'release';
        readonly milestone: string;
        readonly part: string;
        readonly memberId: string;
        readonly reason: string;
      }
    | {
        readonly kind: 'sign';
        readonly milestone: string;
        readonly part: string;
        readonly occurrence: number;
        readonly performedOn: string;
        readonly values: Evidence;
        readonly signerId: string;
        readonly draftedById: string | null;
      }
    | {
        readonly kind: 'draft';
        readonly milestone: string;
        readonly part: string;
        readonly occurrence: number;
        readonly performedOn: string;
        readonly values: Evidence;
        readonly isReady: boolean;
      }
    | {
        readonly kind: 'hold';
        readonly milestone: string;
        readonly reason: string;
        readonly heldOn: string;
        readonly reviewOn: string;
      }
    | {
        readonly kind: 'waive';
        readonly milestone: string;
        readonly occurrence: number;
        readonly waivedOn: string;
        readonly reason: string;
        readonly note: string;
        readonly waiverKind: 'waived' | 'not-recoverable';
      }
    | { readonly kind: 'book'; readonly milestone: string; readonly on: string }
    | {
        readonly kind: 'import';
        readonly milestone: string;
        readonly performedOn: string;
        readonly precision: 'day' | 'month' | 'year';
        readonly isUnverified: boolean;
      }
    | { readonly kind: 'transfer'; readonly on: string; readonly to: string; readonly reason: string }
    | { readonly kind: 'own'; readonly rule: MilestoneRule; readonly finding: Finding; readonly reason: string }
  );

export interface SampleChild {
  readonly id: string;
  readonly acts: readonly SampleAct[];
}
