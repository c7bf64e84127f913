import { gridWidth } from './cut-digits.ts';

/** What a figure looks like, what it was read as ('' where that is not known), and how much that counts. */
export type Sample = { grid: Float32Array; read: string; weight: number };
/** How like each digit of the page a figure looks, -1 to 1. */
export type Likenesses = ReadonlyMap<string, number>;
/** What each digit of the page looks like. */
export type Looks = ReadonlyMap<string, Float32Array>;

const digits = [...'0123456789'];
/** A digit that was read fewer times has no look of its own. */
const fewestReadings = 3;
/** What looks less like a digit than this says nothing of its look: figures cut amiss, or in dirt. */
const leastOfOne = 0.75;
/** After so many rounds no label changed any more in trials. */
const rounds = 4;

/**
 * How like the digits of its own page every figure looks. A typeface has one look for each digit: the mean of what was
 * read as a 3 shows the 3 of the page, though some were read wrongly; figures that look unlike it go where they belong,
 * and the means are taken anew.
 */
export function likenessesOf(samples: readonly Sample[]): { found: Likenesses[]; looks: Looks } {
  let labels = samples.map(({ read }) => read);
  let found: Likenesses[] = [];
  let looks: Looks = new Map();
  for (let round = 0; round < rounds; round += 1) {
    looks = new Map(
      digits.flatMap((digit) => {
        const own = samples.filter((_, at) => labels[at] === digit);
        return own.length < fewestReadings ? [] : [[digit, meanOf(own)] as const];
      }),
    );
    found = samples.map(({ grid }) => new Map([...looks].map(([digit, look]) => [digit, likeness(grid, look)])));
    labels = found.map((each) => ((each.get(mostLike(each)) ?? 0) < leastOfOne ? '' : mostLike(each)));
  }
  return { found, looks };
}

/**
 * How much more a figure looks like one digit of the page than like another, as a share of what tells the two apart: 1
 * for the mean look of the first itself.
 */
export function ratherThan(found: Likenesses, looks: Looks, [one, other]: readonly [string, string]): number {
  const [a, b] = [looks.get(one), looks.get(other)];
  if (a === undefined || b === undefined) return 0;
  return ((found.get(one) ?? 0) - (found.get(other) ?? 0)) / Math.max(0.02, 1 - likeness(a, b));
}

/** The digit that a figure looks like most; '' where the page has no digits. */
export const mostLike = (found: Likenesses): string => {
  let [best, most] = ['', -Infinity];
  for (const [digit, how] of found) if (how > most) [best, most] = [digit, how];
  return best;
};

function meanOf(samples: readonly Sample[]): Float32Array {
  const sum = new Float32Array(samples[0]?.grid.length ?? 0);
  let all = 0;
  for (const { grid, weight } of samples) {
    all += weight;
    for (let at = 0; at < sum.length; at += 1) sum[at] = (sum[at] ?? 0) + (grid[at] ?? 0) * weight;
  }
  return sum.map((each) => each / all);
}

/** How alike two looks are at the best of nine small shifts. */
export function likeness(a: Float32Array, b: Float32Array): number {
  let best = -1;
  for (const down of [-gridWidth, 0, gridWidth])
    for (const along of [-1, 0, 1]) best = Math.max(best, correlation(a, b, down + along));
  return best;
}

/** Normalised cross-correlation, -1 to 1, of one grid with another shifted by so many places. */
function correlation(a: Float32Array, b: Float32Array, shift: number): number {
  let [sumA, sumB, squareA, squareB, product] = [0, 0, 0, 0, 0];
  const [from, to] = [Math.max(0, -shift), a.length - Math.max(0, shift)];
  for (let at = from; at < to; at += 1) {
    const [p, q] = [a[at] ?? 0, b[at + shift] ?? 0];
    sumA += p;
    sumB += q;
    squareA += p * p;
    squareB += q * q;
    product += p * q;
  }
  const n = to - from;
  const spread = Math.sqrt((squareA - (sumA * sumA) / n) * (squareB - (sumB * sumB) / n));
  return spread < 1e-6 ? 0 : (product - (sumA * sumB) / n) / spread;
}
