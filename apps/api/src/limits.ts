/** Every limit of the service, in one place. Times in seconds unless the name says otherwise. */
export const limits = {
  idle: { member: 15 * 60, administrator: 10 * 60 },
  absolute: { member: 10 * 3600, administrator: 4 * 3600 },
  sessionsPerMember: 5,
  invitationValid: 7 * 24 * 3600,
  resetValid: 30 * 60,
  /** Failures before waiting starts, first wait, longest wait, and the count at which only a reset helps. */
  guessing: { free: 5, firstWait: 1, longestWait: 15 * 60, stopAt: 100 },
  guessesPerAddressPerMinute: 30,
  /** Letters with a reset link that may be open for one member at once. */
  openResetsPerMember: 3,
  /** How long a letter is tried, and how long one try holds it. */
  mailTriedFor: 72 * 3600,
  mailLease: 120,
  /** A browser that only looked at the sign-in page is forgotten after this. */
  anonymousSession: 3600,
  jsonBytes: 256 * 1024,
  importBytes: 12 * 1024 * 1024,
  jsonDepth: 20,
  jsonNodes: 5000,
  readsPerMinute: 600,
  writesPerMinute: 120,
  /** A stream of the live view is cut after this and comes back with its permission looked at afresh. */
  streamSeconds: 300,
  streamsPerMember: 20,
  idempotencyKept: 24 * 3600,
  hashing: { atOnce: 2, queue: 50 },
} as const;
