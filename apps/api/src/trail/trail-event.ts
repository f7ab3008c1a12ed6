/**
 * Everything that can happen, as typed events. An operation decides and returns events; applying them is the only way
 * in which facts are written, live and when the database is rebuilt from the trail.
 */
import type { ChildFields } from '@weftway/contract/child';
import type { MemberFields } from '@weftway/contract/member';
import type { Evidence, Signature } from '@weftway/contract/pathway';
import type { EventKind } from '@weftway/contract/trail';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';

interface SignedPayload {
  readonly signature: Signature;
  /** Digest of the child's signature before this one. */
  readonly previousDigest: string;
  /** The canonical text whose digest the signature carries; absent where only the digest was kept. */
  readonly signedText?: string;
  /** The team's local date of signing; absent: the UTC date. */
  readonly signedOn?: string;
}

export interface EventPayloads {
  'team-founded': { readonly name: string; readonly zone: string; readonly sites: readonly string[] };
  'team-settings-changed': { readonly name: string; readonly zone: string; readonly sites: readonly string[] };
  'member-invited': { readonly fields: MemberFields; readonly invitedAt: string };
  'member-invited-again': { readonly invitedAt: string };
  'member-joined': Record<string, never>;
  'member-edited': { readonly fields: MemberFields };
  'member-left': { readonly leftOn: string; readonly reason: string };
  'cover-set': { readonly cover: { readonly byId: string; readonly from: string; readonly until: string } | null };
  /** The password itself never reaches the trail. */
  'password-set': Record<string, never>;
  'password-changed': Record<string, never>;
  'signed-in': Record<string, never>;
  /** Of an address that nobody has, nothing is kept but that somebody tried. */
  'sign-in-refused': Record<string, never>;
  'signed-out': {
    readonly because: 'signed-out' | 'ended-elsewhere' | 'too-many' | 'password' | 'account-changed' | 'left';
    readonly sessions: number;
  };
  'protocol-added': { readonly version: number; readonly document: Protocol; readonly changes: string };
  'protocol-activated': { readonly version: number; readonly agreedBy: string; readonly reason: string };
  'child-moved-to-protocol': {
    readonly version: number;
    readonly reason: string;
    /** Unfinished windows that the version moves, for the reader of the trail. */
    readonly moved?: readonly {
      readonly milestone: string;
      readonly before: string | null;
      readonly after: string | null;
    }[];
  };
  'child-registered': { readonly fields: ChildFields; readonly protocolVersion: number };
  'child-edited': { readonly fields: ChildFields };
  'child-transferred': { readonly on: string; readonly to: string; readonly reason: string };
  'child-returned': { readonly reason: string };
  'care-ended': { readonly on: string; readonly reason: string };
  'lead-handed-on': { readonly leadClinicianId: string | null; readonly reason: string };
  'trainees-assigned': { readonly memberIds: readonly string[] };
  'import-accepted': {
    readonly importId: string;
    readonly fileName: string;
    readonly added: number;
    readonly updated: number;
  };
  'history-imported': {
    readonly performedOn: string;
    readonly precision: 'day' | 'month' | 'year';
    readonly isUnverified: boolean;
    readonly results: Readonly<Record<string, string>>;
    readonly source: string;
  };
  'import-confirmed': Record<string, never>;
  'milestone-claimed': { readonly part: string; readonly memberId: string };
  'milestone-released': { readonly part: string; readonly memberId: string; readonly reason: string };
  'milestone-handed-over': {
    readonly part: string;
    readonly from: string | null;
    readonly to: string;
    readonly reason: string;
  };
  'draft-saved': {
    readonly part: string;
    readonly occurrence: number;
    readonly values: Evidence;
    readonly performedOn: string | null;
    readonly isReady: boolean;
  };
  'milestone-signed': SignedPayload & { readonly draftedById: string | null };
  'signature-amended': SignedPayload;
  'milestone-held': { readonly reason: string; readonly heldOn: string; readonly reviewOn: string };
  'hold-lifted': { readonly reason: string };
  'milestone-waived': {
    readonly id: string;
    readonly occurrence: number;
    readonly kind: 'waived' | 'not-recoverable';
    readonly reason: string;
    readonly note: string;
    readonly secondName: string | null;
    readonly offerAgainOn: string | null;
    readonly waivedOn: string;
  };
  'booking-set': { readonly on: string; readonly reason: string };
  'booking-removed': { readonly reason: string };
  'finding-recorded': { readonly name: string; readonly on: string; readonly note: string };
  'finding-withdrawn': { readonly name: string; readonly note: string };
  'own-milestone-added': { readonly rule: MilestoneRule; readonly reason: string; readonly addedOn: string };
}

/** What an operation returns: who and when are added when it is written. */
export type TrailEvent = {
  [K in EventKind]: {
    readonly kind: K;
    readonly childId?: string;
    readonly memberId?: string;
    /** Milestone key. */
    readonly milestone?: string;
    /** What stood there before, for the reader of the trail. */
    readonly before?: unknown;
    readonly after: EventPayloads[K];
  };
}[EventKind];

export type EventOf<K extends EventKind> = Extract<TrailEvent, { kind: K }>;

/** Who did it, when, in answer to which request. */
export interface EventStamp {
  readonly seq: number;
  readonly at: string;
  readonly actorId: string | null;
  readonly actorName: string;
  readonly actorRole: string;
  readonly requestId: string;
}

/** Writes the facts of one kind of event. */
export type Applier<K extends EventKind> = (
  trx: import('knex').Knex,
  event: EventOf<K>,
  stamp: EventStamp,
) => Promise<void>;
export type Appliers<K extends EventKind> = { readonly [Kind in K]: Applier<Kind> };
