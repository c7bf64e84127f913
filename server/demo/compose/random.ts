import { randomFromSeed } from '#shared/kit/random.ts';

/** Chance that comes out the same on every run: the demo pages must not change by being composed again. */
export type Random = () => number;

/** Seeds from words (FNV-1a), so that each page has its own chance whatever the order of drawing. */
export function randomFrom(words: string): Random {
  let seed = 0x811c9dc5;
  for (let index = 0; index < words.length; index += 1) {
    seed = Math.imul(seed ^ words.charCodeAt(index), 0x01000193);
  }
  return randomFromSeed(seed);
}

/** About -1 to 1, mostly near 0. */
export const swing = (random: Random): number => random() + random() - 1;

/** A slowly changing surface, 0 to 1: `cell` is the distance in pixels over which it changes. */
export function unevenness(random: Random, size: { width: number; height: number }, cell: number) {
  const columns = Math.ceil(size.width / cell) + 2;
  const grid = Float32Array.from({ length: columns * (Math.ceil(size.height / cell) + 2) }, random);
  const at = (column: number, row: number): number => grid[row * columns + column] ?? 0;
  return (x: number, y: number): number => {
    const column = Math.floor(x / cell);
    const row = Math.floor(y / cell);
    const across = x / cell - column;
    const down = y / cell - row;
    const above = at(column, row) * (1 - across) + at(column + 1, row) * across;
    const below = at(column, row + 1) * (1 - across) + at(column + 1, row + 1) * across;
    return above * (1 - down) + below * down;
  };
}
