/** When to ask whether somebody is still there, and when the screen locks. Instants in milliseconds. */
export interface Clock {
  /** The last activity that the server knows of. */
  readonly activeAt: number;
  readonly idleSeconds: number;
  /** End of the session however active; null: not known. */
  readonly endsAt: number | null;
}

export type Phase =
  | { readonly kind: 'in' }
  | { readonly kind: 'warning'; readonly because: 'quiet' | 'day'; readonly secondsLeft: number }
  | { readonly kind: 'over' };

export const warnSeconds = 120;

export const phaseAt = (now: number, { activeAt, idleSeconds, endsAt }: Clock): Phase => {
  const quietEnd = activeAt + idleSeconds * 1000;
  const end = endsAt === null ? quietEnd : Math.min(quietEnd, endsAt);
  const secondsLeft = Math.ceil((end - now) / 1000);
  if (secondsLeft <= 0) return { kind: 'over' };
  return secondsLeft <= warnSeconds
    ? { kind: 'warning', because: end === quietEnd ? 'quiet' : 'day', secondsLeft }
    : { kind: 'in' };
};
