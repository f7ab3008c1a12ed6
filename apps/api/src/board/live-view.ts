/** Tells every open board that something changed; carries only the version, never content. */
export interface LiveView {
  readonly changed: (version: number) => void;
  /** Answers how to stop listening. */
  readonly listen: (hear: (version: number) => void) => () => void;
}

export const createLiveView = (): LiveView => {
  const listeners = new Set<(version: number) => void>();
  return {
    changed: (version) => {
      for (const hear of listeners) hear(version);
    },
    listen: (hear) => {
      listeners.add(hear);
      return () => listeners.delete(hear);
    },
  };
};
