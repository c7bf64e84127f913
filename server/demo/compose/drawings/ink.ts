/** Strokes of the draughtsman's pen, as SVG; lettering is kept apart so that it needs no system type face. */

export interface Lettering {
  readonly x: number;
  /** Base line. */
  readonly y: number;
  readonly text: string;
  /** Where x stands in the text. */
  readonly at?: 'start' | 'middle' | 'end';
}

/** All in dots at 300 to the inch. */
export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly string[];
  readonly lettering: readonly Lettering[];
}

export type Point = readonly [x: number, y: number];

export const line = (...points: readonly Point[]): string =>
  `<polyline points="${points.map(([x, y]) => `${x},${y}`).join(' ')}"/>`;

export const box = ([x, y]: Point, [width, height]: Point): string =>
  `<rect x="${x}" y="${y}" width="${width}" height="${height}"/>`;

export const circle = ([x, y]: Point, radius: number): string => `<circle cx="${x}" cy="${y}" r="${radius}"/>`;

export const dot = ([x, y]: Point): string => `<circle cx="${x}" cy="${y}" r="7" fill="black"/>`;

/** A line with a head at its last point; the last stretch must be level or upright. */
export function arrow(...points: readonly Point[]): string {
  const [endX, endY] = points.at(-1) ?? [0, 0];
  const [fromX, fromY] = points.at(-2) ?? [0, 0];
  const [alongX, alongY] = [Math.sign(endX - fromX) * 22, Math.sign(endY - fromY) * 22];
  const sideX = alongY === 0 ? 0 : 9;
  const sideY = alongX === 0 ? 0 : 9;
  const head = `M${endX},${endY} L${endX - alongX + sideX},${endY - alongY + sideY} L${endX - alongX - sideX},${endY - alongY - sideY} Z`;
  return `${line(...points)}<path d="${head}" fill="black"/>`;
}

/** Upright resistor, 120 dots from `top` down. */
export function resistor([x, y]: Point): string {
  const teeth = [0, 1, 2, 3, 4, 5].map((index): Point => [x + (index % 2 === 0 ? 16 : -16), y + 27 + index * 13]);
  return line([x, y], [x, y + 20], ...teeth, [x, y + 100], [x, y + 120]);
}

/** Upright capacitor, 120 dots; the lower plate is curved, as it is the grounded one. */
export const capacitor = ([x, y]: Point): string =>
  `${line([x, y], [x, y + 52])}${line([x - 28, y + 52], [x + 28, y + 52])}` +
  `<path d="M${x - 28},${y + 76} Q${x},${y + 60} ${x + 28},${y + 76}"/>${line([x, y + 68], [x, y + 120])}`;

/** Level capacitor, 120 dots from `left`. */
export const capacitorAcross = ([x, y]: Point): string =>
  line([x, y], [x + 51, y]) +
  line([x + 51, y - 28], [x + 51, y + 28]) +
  line([x + 69, y - 28], [x + 69, y + 28]) +
  line([x + 69, y], [x + 120, y]);

/** Upright coil, 140 dots, with the arrow of an adjustable core. */
export function coil([x, y]: Point): string {
  const turns = [0, 1, 2, 3].map(() => 'a12,12.5 0 0 1 0,25').join(' ');
  return `<path d="M${x},${y} v20 ${turns} v20"/>${arrow([x + 42, y + 110], [x + 42, y + 24])}`;
}

export const ground = ([x, y]: Point): string =>
  line([x, y], [x, y + 22]) +
  line([x - 26, y + 22], [x + 26, y + 22]) +
  line([x - 17, y + 31], [x + 17, y + 31]) +
  line([x - 8, y + 40], [x + 8, y + 40]);

/** Upright crystal, 120 dots. */
export const crystal = ([x, y]: Point): string =>
  line([x, y], [x, y + 38]) +
  line([x - 26, y + 38], [x + 26, y + 38]) +
  box([x - 22, y + 48], [44, 24]) +
  line([x - 26, y + 82], [x + 26, y + 82]) +
  line([x, y + 82], [x, y + 120]);

/** A tube about `centre`, radius 78: plate at the top, grid at the left, cathode at the bottom. */
export const tube = ([x, y]: Point): string =>
  circle([x, y], 78) +
  line([x, y - 110], [x, y - 36]) +
  line([x - 32, y - 36], [x + 32, y - 36]) +
  [-40, -16, 8, 32].map((offset) => line([x + offset - 6, y], [x + offset + 10, y])).join('') +
  line([x - 110, y], [x - 54, y]) +
  line([x - 28, y + 44], [x - 28, y + 34], [x + 28, y + 34]) +
  line([x - 28, y + 44], [x - 28, y + 110]);
