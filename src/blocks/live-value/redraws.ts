/** Of a frame of 16 ms, what redrawing may take; the rest is for the typing that goes on, and for layout. */
const sliceMs = 4;
const atOnce = 4;

export type Redraws = { ask: (redraws: Iterable<() => void>) => void };

type Given = { /** Draws at once what the calls inside change. */ drawNow: (work: () => void) => void };

/**
 * Lets a thousand values on a page follow a change without holding up whoever types: some are drawn in each frame, in the
 * order of the page, until all are. One that is asked for twice is drawn once, with what it is by then.
 */
export function createRedraws({ drawNow }: Given): Redraws {
  const waiting = new Set<() => void>();
  let isRunning = false;
  const drawSome = (): void => {
    const end = performance.now() + sliceMs;
    while (waiting.size > 0 && performance.now() < end) {
      const some = [...waiting].slice(0, atOnce);
      for (const redraw of some) waiting.delete(redraw);
      drawNow(() => some.forEach((redraw) => redraw()));
    }
    isRunning = waiting.size > 0;
    if (isRunning) requestAnimationFrame(drawSome);
  };
  return {
    ask(redraws) {
      for (const redraw of redraws) waiting.add(redraw);
      if (isRunning || waiting.size === 0) return;
      isRunning = true;
      requestAnimationFrame(drawSome);
    },
  };
}
