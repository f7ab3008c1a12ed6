const againAfterMs = 3000;

/** Fetches a part of the screens that must come. Without an answer it is asked for again every few seconds. */
export const fetchUntilThere = async <Part>(fetchPart: () => Promise<Part>): Promise<Part> => {
  for (;;) {
    try {
      return await fetchPart();
    } catch {
      await new Promise((resolve) => setTimeout(resolve, againAfterMs));
    }
  }
};
