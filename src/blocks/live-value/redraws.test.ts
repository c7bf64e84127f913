import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createRedraws } from './redraws.ts';

let clock = 0;
let frames: (() => void)[] = [];
beforeEach(() => {
  clock = 0;
  frames = [];
  vi.spyOn(performance, 'now').mockImplementation(() => clock);
  vi.stubGlobal('requestAnimationFrame', (frame: () => void) => frames.push(frame));
});
afterEach(() => {
  vi.restoreAllMocks();
  vi.unstubAllGlobals();
});

const nextFrame = (): void => frames.splice(0).forEach((frame) => frame());
const drawNow = (work: () => void): void => work();

describe('the values of a page after a change', () => {
  it('are drawn over several frames, in order, until all are', () => {
    const drawn: number[] = [];
    createRedraws({ drawNow }).ask(
      Array.from({ length: 20 }, (_, at) => () => {
        drawn.push(at);
        clock += 1;
      }),
    );
    expect(drawn).toEqual([]);
    nextFrame();
    expect(drawn.length).toBeGreaterThan(0);
    expect(drawn.length).toBeLessThan(20);
    while (frames.length > 0) nextFrame();
    expect(drawn).toEqual(Array.from({ length: 20 }, (_, at) => at));
  });

  it('are each drawn once, however often they are asked for before their turn', () => {
    const redraws = createRedraws({ drawNow });
    const draw = vi.fn();
    redraws.ask([draw]);
    redraws.ask([draw]);
    nextFrame();
    expect(draw).toHaveBeenCalledTimes(1);
    redraws.ask([draw]);
    nextFrame();
    expect(draw).toHaveBeenCalledTimes(2);
  });
});
