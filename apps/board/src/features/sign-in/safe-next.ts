/** Where to go after sign-in: only to paths of our own, never to another site. */
const ownPlace = /^\/(my-work|board|children|protocol|team|trail|account|api-reference)(?=$|[/?])/;

/** The path to go to, or null when it is missing or not one of ours. */
export const safeNext = (next: string | null): string | null => {
  if (next === null || next.includes('\\') || !ownPlace.test(next)) return null;
  const url = new URL(next, 'https://own.example');
  return url.host === 'own.example' && ownPlace.test(url.pathname) ? url.pathname + url.search : null;
};
