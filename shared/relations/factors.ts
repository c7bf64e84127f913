import type { PrintedNumber } from './printed-number.ts';

/** Multiplications are chains of doublers, triplers and quintuplers; up to 12 any number. Common practice, no source. */
const largestFactor = 128;
const isSmooth = (count: number): boolean => {
  let left = count;
  for (const prime of [2, 3, 5]) while (left % prime === 0) left /= prime;
  return left === 1;
};

export type Factor = { k: number; prior: number; number: PrintedNumber | undefined };

/**
 * The whole numbers tried as factors, each with its share of belief: less the larger it is, more if the manual prints it
 * as a number of its own.
 */
export function factorsFor(numbers: readonly PrintedNumber[]): Factor[] {
  const counts = numbers.filter(
    ({ dimension, value, unit }) => dimension === 'plain number' && unit === '' && Number.isInteger(value),
  );
  const different = new Set(counts.map(({ value }) => value)).size;
  const factors: Factor[] = [];
  for (let k = 1; k <= largestFactor; k += 1) {
    const number = k === 1 ? undefined : counts.find(({ value }) => value === k);
    if (k > 12 && !isSmooth(k) && number === undefined) continue;
    // Powers of 1.3 fall slowly enough for a multiplication of 96, and add up to about one with a half in front.
    const own = 0.5 / k ** 1.3;
    factors.push({ k, number, prior: number === undefined ? own : Math.max(own, 0.3 / different) });
  }
  // The count of a synthesiser may be any number, if it is printed.
  for (const number of counts)
    if (number.value > largestFactor && !factors.some(({ k }) => k === number.value))
      factors.push({ k: number.value, number, prior: 0.3 / different });
  return factors;
}
