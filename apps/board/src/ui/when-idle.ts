/** Runs later, when nobody waits for anything; a second at most after nothing else is under way. */
export const whenIdle = (act: () => void): void => {
  if (typeof requestIdleCallback === 'function') setTimeout(() => requestIdleCallback(act), 1000);
  else setTimeout(act, 2000);
};
