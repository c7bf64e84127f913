/**
 * A dimension is a list of exponents over the five SI base units that radio work needs and tags for levels and °F.
 * The tags keep a level in dBm from being added to another: only differences of levels are plain decibels.
 */
const axes = ['m', 'kg', 's', 'A', 'K', 'dB', 'dBm', 'dBµV', '°F'] as const;
type Axis = (typeof axes)[number];
export type Dimension = readonly number[];

const from = (exponents: Partial<Record<Axis, number>>): Dimension => axes.map((axis) => exponents[axis] ?? 0);

/** Exponents as in the SI brochure (BIPM, 9th edition, table 4). */
export const dimensions = {
  'plain number': from({}),
  length: from({ m: 1 }),
  time: from({ s: 1 }),
  frequency: from({ s: -1 }),
  temperature: from({ K: 1 }),
  'temperature in °F': from({ '°F': 1 }),
  current: from({ A: 1 }),
  voltage: from({ kg: 1, m: 2, s: -3, A: -1 }),
  'field strength': from({ kg: 1, m: 1, s: -3, A: -1 }),
  power: from({ kg: 1, m: 2, s: -3 }),
  resistance: from({ kg: 1, m: 2, s: -3, A: -2 }),
  conductance: from({ kg: -1, m: -2, s: 3, A: 2 }),
  capacitance: from({ kg: -1, m: -2, s: 4, A: 2 }),
  inductance: from({ kg: 1, m: 2, s: -2, A: -2 }),
  'level difference': from({ dB: 1 }),
  'power level': from({ dBm: 1 }),
  'voltage level': from({ dBµV: 1 }),
} as const;
export type DimensionName = keyof typeof dimensions;

export const plainNumber = dimensions['plain number'];

/** Roots make fractional exponents; anything nearer than this is the same exponent. */
const exponentGrain = 1e-9;
export const isSameDimension = (a: Dimension, b: Dimension): boolean =>
  axes.every((_, at) => Math.abs((a[at] ?? 0) - (b[at] ?? 0)) < exponentGrain);
export const isPlain = (dimension: Dimension): boolean => isSameDimension(dimension, plainNumber);

export const multiplyDimensions = (a: Dimension, b: Dimension): Dimension => a.map((each, at) => each + (b[at] ?? 0));
export const divideDimensions = (a: Dimension, b: Dimension): Dimension => a.map((each, at) => each - (b[at] ?? 0));
export const raiseDimension = (a: Dimension, power: number): Dimension => a.map((each) => each * power);

/** The dimension of a sum or difference, or undefined where the two do not belong together. */
export function addDimensions(a: Dimension, b: Dimension, sign: '+' | '-'): Dimension | undefined {
  const decibel = dimensions['level difference'];
  const isLevel = (each: Dimension) =>
    isSameDimension(each, dimensions['power level']) || isSameDimension(each, dimensions['voltage level']);
  if (isSameDimension(a, b)) {
    if (!isLevel(a)) return a;
    return sign === '-' ? decibel : undefined;
  }
  if (isLevel(a) && isSameDimension(b, decibel)) return a;
  if (isLevel(b) && isSameDimension(a, decibel) && sign === '+') return b;
  return undefined;
}

/** A word for messages: `frequency`, or the exponents where there is no word. */
export function describeDimension(dimension: Dimension): string {
  const named = Object.entries(dimensions).find(([, each]) => isSameDimension(each, dimension));
  if (named !== undefined) return named[0];
  return axes
    .map((axis, at) => ({ axis, power: dimension[at] ?? 0 }))
    .filter(({ power }) => Math.abs(power) >= exponentGrain)
    .map(({ axis, power }) => (power === 1 ? axis : `${axis}^${Number(power.toFixed(3))}`))
    .join(' ');
}

/** One word per dimension, used as the first half of a search key. */
export const dimensionKey = (dimension: Dimension): string => describeDimension(dimension).replaceAll(' ', '-');
