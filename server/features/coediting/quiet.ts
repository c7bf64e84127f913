/** Runs something for a page once nothing has happened on it for a while. */
export type Quiet = {
  /** Something happened on the page: the wait begins anew. */
  stir: (pageId: string) => void;
  /** Runs what was waited for at once. */
  settle: (pageId: string) => void;
  stop: () => void;
};

export function whenQuiet(quietMs: number, run: (pageId: string) => void): Quiet {
  const timers = new Map<string, NodeJS.Timeout>();
  const settle = (pageId: string): void => {
    clearTimeout(timers.get(pageId));
    timers.delete(pageId);
    run(pageId);
  };
  return {
    stir(pageId) {
      clearTimeout(timers.get(pageId));
      timers.set(pageId, setTimeout(() => settle(pageId), quietMs).unref());
    },
    settle,
    stop() {
      for (const timer of timers.values()) clearTimeout(timer);
      timers.clear();
    },
  };
}
