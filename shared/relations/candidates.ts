import { beliefIn, lowerBound, type Chance } from './chance.ts';
import type { Factor } from './factors.ts';
import type { Node } from './nodes.ts';

/** k x = y + sign z; `z` is absent in a plain multiple. All of a = b +- c, a = k b, a = (b +- c)/k and a = k b +- c is this. */
export type Candidate = {
  factor: Factor;
  x: Node;
  y: Node;
  z: Node | undefined;
  sign: 1 | -1;
  /** How many relations this good chance alone would give. */
  expected: number;
};

type Search = { sorted: readonly Node[]; values: Float64Array; coarsest: Float64Array; chance: Chance; most: number };

/** Relations among values of one dimension that hold within their printed digits, and that chance gives less than `most` times. */
export function findCandidates(
  nodes: readonly Node[],
  { factors, chance, most }: { factors: readonly Factor[]; chance: Chance; most: number },
): Candidate[] {
  const sorted = nodes.toSorted((a, b) => a.value - b.value);
  const values = Float64Array.from(sorted.map(({ value }) => value));
  const search: Search = { sorted, values, coarsest: coarsestUpTo(sorted), chance, most };
  const found: Candidate[] = [];
  for (const y of sorted) {
    for (const factor of factors) if (factor.k > 1) collect(found, search, { factor, y, z: undefined, sign: 1 });
    for (const z of sorted) {
      if (z.value > y.value || z === y || areStrangers(y, z)) continue;
      for (const factor of factors) {
        collect(found, search, { factor, y, z, sign: 1 });
        // With k = 1 a difference is the sum of another pair.
        if (factor.k > 1) collect(found, search, { factor, y, z, sign: -1 });
      }
    }
  }
  return found;
}

/** Values of two rows of one table, printed nowhere else, are related by their columns or not at all. */
function areStrangers(a: Node, b: Node): boolean {
  if (a.inText || b.inText || a.rows.size === 0 || b.rows.size === 0) return false;
  for (const row of a.rows) if (b.rows.has(row)) return false;
  return true;
}

/** The widest half digit among values up to each one: how far to look around a predicted value. */
function coarsestUpTo(sorted: readonly Node[]): Float64Array {
  const widest = new Float64Array(sorted.length);
  let most = 0;
  sorted.forEach(({ grain, value }, at) => {
    // A value known to less than 0.2 % proves nothing by being met.
    if (grain <= Math.abs(value) * 0.002) most = Math.max(most, grain / 2);
    widest[at] = most;
  });
  return widest;
}

type Sum = Omit<Candidate, 'x' | 'expected'>;

function collect(found: Candidate[], search: Search, sum: Sum): void {
  const { sorted, values, coarsest } = search;
  const { factor, y, z, sign } = sum;
  const predicted = (y.value + sign * (z?.value ?? 0)) / factor.k;
  if (!(predicted > 0)) return;
  const near = lowerBound(values, predicted);
  const slack = (y.grain + (z?.grain ?? 0)) / (2 * factor.k) + (coarsest[Math.min(near, values.length - 1)] ?? 0);
  for (let at = lowerBound(values, predicted - slack); at < values.length; at += 1) {
    const x = sorted[at];
    if (x === undefined || x.value > predicted + slack) return;
    if (!canJoin(x, sum)) continue;
    const expected = expectedByChance(search.chance, { ...sum, x });
    if (expected < search.most) found.push({ ...sum, x, expected });
  }
}

const canJoin = (x: Node, { y, z }: Sum): boolean =>
  x !== y && x !== z && !areStrangers(x, y) && (z === undefined || !areStrangers(x, z));

/**
 * Counting every trial as independent finds ten times too many. With this, the proposals of 300 made-up manuals (not those of
 * the tests) that were expected by chance up to 0.3 times in each were false 0.32 times in each; up to 0.1 times, 0.13 times.
 */
const overcount = 10;
/** How many times the common rounding each part of a relation must be. */
const leastPart = 4;
/** A double's last digits, among values of this size. */
const noise = 1e-12;

function expectedByChance(
  chance: Chance,
  { factor: { k, prior }, x, y, z, sign }: Omit<Candidate, 'expected'>,
): number {
  const rest = Math.abs(k * x.value - y.value - sign * (z?.value ?? 0));
  const slacks = [k * x.grain, y.grain, ...(z === undefined ? [] : [z.grain])];
  // A part hardly larger than the rounding of the others is no part: any small number would do.
  const rounding = slacks.reduce((total, each) => total + each, 0);
  if (Math.min(k * x.value, y.value, z?.value ?? Infinity) < leastPart * rounding) return Infinity;
  const width = widthOf(rest - noise * y.value, slacks);
  if (width === Infinity) return Infinity;
  const grids = [k * x.grid, y.grid, ...(z === undefined ? [] : [z.grid])];
  const densities = [chance.densityAt(x) / k, chance.densityAt(y), ...(z === undefined ? [] : [chance.densityAt(z)])];
  // The widest spread of the three decides how thinly their sum is spread.
  const hits = Math.max(width, Math.min(...grids)) * Math.min(...densities);
  // Each pair is tried once but with two signs, so that weights of ordered pairs need no correction.
  return hits / (together(chance, { x, y, z }) * prior * overcount * beliefIn(x.dimension));
}

/**
 * The width that the agreement is worth. Usually one of the numbers was computed from the others as they are printed, so
 * the rest is within half of its own last digit alone; now and then all of them are rounded.
 */
function widthOf(rest: number, slacks: readonly number[]): number {
  const sum = slacks.reduce((total, each) => total + each, 0);
  if (rest > sum / 2) return Infinity;
  const likelihood = slacks.reduce(
    (total, each) => total + (rest <= each / 2 ? 0.9 / slacks.length / each : 0),
    0.1 / sum,
  );
  return 1 / likelihood;
}

/** How much of the trying falls on these numbers together, from whichever of them one sets out. */
function together({ partner }: Chance, { x, y, z }: Pick<Candidate, 'x' | 'y' | 'z'>): number {
  if (z === undefined) return Math.max(partner(x, y), partner(y, x));
  return Math.max(partner(x, y) * partner(x, z), partner(y, x) * partner(y, z), partner(z, x) * partner(z, y));
}
