/** Which open milestone goes to whom, while a hand-over is being put together. */
import type { AnswerOf } from '@weftway/contract/operation';
import type { listOpenClaims } from '@weftway/contract/member';

export type OpenWorkOf = AnswerOf<typeof listOpenClaims>;
export type OpenClaim = OpenWorkOf['claims'][number];

/** `null`: let go on purpose. A claim that is not in the map stays as it is. */
export type Choices = ReadonlyMap<string, string | null>;

export const claimKey = ({ childId, milestone, part }: Pick<OpenClaim, 'childId' | 'milestone' | 'part'>): string =>
  `${childId} ${milestone} ${part}`;

export const chosen = (choices: Choices, claim: OpenClaim, to: string | null | undefined): Choices => {
  const next = new Map(choices);
  if (to === undefined) next.delete(claimKey(claim));
  else next.set(claimKey(claim), to);
  return next;
};

/** Gives a colleague each of these that they may hold; answers the choices and how many were given. */
export const giveAll = (
  choices: Choices,
  claims: readonly OpenClaim[],
  to: string,
): { readonly choices: Choices; readonly given: number } => {
  const mine = claims.filter((claim) => claim.mayHold.includes(to));
  return { choices: mine.reduce((map, claim) => chosen(map, claim, to), choices), given: mine.length };
};

/** Who may hold what, once somebody else leads the children. */
export const onceLedBy = (claims: readonly OpenClaim[], leadTo: string): readonly OpenClaim[] =>
  claims.map((claim) =>
    claim.mayHoldAsLead.includes(leadTo) ? { ...claim, mayHold: [...claim.mayHold, leadTo] } : claim,
  );

/** Without what was given to somebody who may not hold it any more. */
export const stillPossible = (choices: Choices, claims: readonly OpenClaim[]): Choices => {
  const byKey = new Map(claims.map((claim) => [claimKey(claim), claim]));
  return new Map([...choices].filter(([key, to]) => to === null || byKey.get(key)?.mayHold.includes(to) === true));
};

/** What is sent: only what was chosen and is still held. */
export const itemsOf = (choices: Choices, claims: readonly OpenClaim[]) =>
  claims.flatMap((claim) => {
    const to = choices.get(claimKey(claim));
    return to === undefined ? [] : [{ childId: claim.childId, milestone: claim.milestone, part: claim.part, to }];
  });

/** Titles with how many of the claims carry them, most frequent first. */
export const titlesOf = (
  claims: readonly OpenClaim[],
): readonly { readonly title: string; readonly count: number }[] => {
  const counts = new Map<string, number>();
  for (const { title } of claims) counts.set(title, (counts.get(title) ?? 0) + 1);
  return [...counts]
    .map(([title, count]) => ({ title, count }))
    .sort((a, b) => b.count - a.count || a.title.localeCompare(b.title));
};
