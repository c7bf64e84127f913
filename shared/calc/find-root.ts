import { isAbout } from '#shared/expressions/compile-expression.ts';

/** Solving y(x) = target for one x. Where `y` has no value it gives NaN. */
export type RootTask = {
  y: (x: number) => number;
  target: number;
  start: number;
  scale: number;
  low: number;
  high: number;
};
export type Root = { x: number; method: 'affine' | 'bracketed' };

/** A straight line is solved exactly; anything else by bracketing and halving. Undefined where nothing was found. */
export function findRoot(task: RootTask): Root | undefined {
  const straight = solveAffine(task);
  if (straight !== undefined) return { x: straight, method: 'affine' };
  const bracketed = solveBracketed(task);
  return bracketed === undefined ? undefined : { x: bracketed, method: 'bracketed' };
}

/** Differences of a straight line agree to this share; a curve's do not at steps of a thousandth. */
const straightWithin = 1e-9;

function solveAffine({ y, target, start, scale, low, high }: RootTask): number | undefined {
  const step = scale / 1024;
  const at = y(start);
  const slope = (y(start + step) - at) / step;
  const noise = noiseOf(at, target);
  const isStraight =
    Number.isFinite(slope) &&
    slope !== 0 &&
    [-3, 2, 512].every((times) => {
      const off = y(start + times * step) - at - slope * times * step;
      return Math.abs(off) <= straightWithin * Math.abs(slope * times * step) + noise * Math.abs(times);
    });
  if (!isStraight) return undefined;
  let x = start + (target - at) / slope;
  // The slope carries a double's last digits; two corrections take them out of the answer.
  for (let turn = 0; turn < 2; turn += 1) x += (target - y(x)) / slope;
  return isWithin(x, low, high) && hits(y(x), target, Math.max(noise, Math.abs(slope) * scale * 1e-13)) ? x : undefined;
}

const isWithin = (x: number, low: number, high: number): boolean =>
  (x >= low || isAbout(x, low)) && (x <= high || isAbout(x, high));

/** What a double may be off by after a few operations among numbers of this size: some eight of its last digits. */
const noiseOf = (...sizes: number[]): number => 2 ** -50 * Math.max(...sizes.map(Math.abs));

/** Near enough to be the same printed value whatever the digits, or as near as doubles come. */
const hits = (value: number, target: number, noise: number): boolean =>
  Math.abs(value - target) <= Math.max(1e-10 * Math.abs(target), noise);

function solveBracketed(task: RootTask): number | undefined {
  const { y, target, start } = task;
  const points = samplesOf(task).map((x) => ({ x, off: y(x) - target }));
  const exact = nearest(
    points.filter(({ off }) => off === 0).map(({ x }) => x),
    start,
  );
  if (exact !== undefined) return exact;
  const crossings: [number, number][] = [];
  points.forEach((point, at) => {
    const next = points[at + 1];
    if (next !== undefined && point.off * next.off < 0) crossings.push([point.x, next.x]);
  });
  crossings.sort((a, b) => distance(a, start) - distance(b, start));
  for (const [from, to] of crossings) {
    const x = halve(task, from, to);
    // A sign change may be a jump or a pole; only a hit counts.
    if (hits(y(x), target, noiseOf(y(start), target))) return x;
  }
  return undefined;
}

const distance = ([from, to]: [number, number], start: number): number =>
  from <= start && start <= to ? 0 : Math.min(Math.abs(from - start), Math.abs(to - start));
const nearest = (xs: readonly number[], start: number): number | undefined =>
  xs.toSorted((a, b) => Math.abs(a - start) - Math.abs(b - start))[0];

/** Even steps between two limits, and doublings away from the start and from zero: roots far off are found too. */
function samplesOf({ start, scale, low, high }: RootTask): number[] {
  const xs = new Set<number>([start]);
  for (let power = -40; power <= 40; power += 0.5) {
    const factor = 2 ** power;
    [start + scale * factor, start - scale * factor, scale * factor, -scale * factor].forEach((x) => xs.add(x));
  }
  if (Number.isFinite(low) && Number.isFinite(high))
    for (let at = 0; at <= 256; at += 1) xs.add(low + ((high - low) * at) / 256);
  return [...xs].filter((x) => x >= low && x <= high).sort((a, b) => a - b);
}

/** Halving until the two ends are neighbouring doubles: slower than cleverer ways, and cannot run away. */
function halve({ y, target }: RootTask, from: number, to: number): number {
  let [left, right] = [from, to];
  const leftIsBelow = y(left) < target;
  for (let turn = 0; turn < 1100; turn += 1) {
    const middle = left + (right - left) / 2;
    if (middle <= left || middle >= right) break;
    if (y(middle) < target === leftIsBelow) left = middle;
    else right = middle;
  }
  return Math.abs(y(left) - target) <= Math.abs(y(right) - target) ? left : right;
}
