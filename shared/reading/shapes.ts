import type { Mended } from './mended.ts';

/** A cell's text with its figures as 9, capitals as A and small letters as a: what part numbers of one maker share. */
export const shapeOf = (text: string): string => text.replace(/\d/g, '9').replace(/[A-Z]/g, 'A').replace(/[a-z]/g, 'a');

const fewestOfAShape = 3;
const leastShapeShare = 0.08;

/** The shapes that a column keeps to; a shape that turns up once or twice is more likely a slip. */
export function commonShapes(texts: readonly string[]): Set<string> {
  const counts = new Map<string, number>();
  for (const text of texts) counts.set(shapeOf(text), (counts.get(shapeOf(text)) ?? 0) + 1);
  const least = Math.max(fewestOfAShape, texts.length * leastShapeShare);
  return new Set([...counts].filter(([, count]) => count >= least).map(([shape]) => shape));
}

const figureLike: Record<string, string> = {
  B: '8',
  O: '0',
  o: '0',
  D: '0',
  Q: '0',
  S: '5',
  s: '5',
  I: '1',
  l: '1',
  i: '1',
  Z: '2',
  z: '2',
  G: '6',
  T: '7',
  '!': '1',
  '|': '1',
};
const capitalLike: Record<string, string> = {
  '8': 'B',
  '0': 'O',
  '5': 'S',
  '1': 'I',
  '2': 'Z',
  '6': 'G',
  ']': 'J',
  '€': 'C',
  '¢': 'C',
  $: 'S',
  c: 'C',
  s: 'S',
  x: 'X',
  z: 'Z',
  v: 'V',
  w: 'W',
  k: 'K',
  p: 'P',
};
const signLike: Record<string, string> = { ':': '-', '~': '-', ';': '-', ',': '.' };

/** Makes a cell into one of the column's shapes, if look-alikes and stray signs at its ends are all that is amiss. */
export function mendShape(text: string, shapes: ReadonlySet<string>): Mended | null {
  if (shapes.size === 0 || shapes.has(shapeOf(text))) return null;
  const stripped = text.replace(/^[^A-Za-z0-9€$¢.+-]+|^[.:~'-]+(?=\w)|[^A-Za-z0-9\])]+$/g, '');
  if (shapes.has(shapeOf(stripped))) return { text: stripped, sure: false };
  // One nought read as a letter and a figure: "H00-0276B" for "H0-0276B".
  const tries = [stripped, stripped.replace(/O0|0O/, '0')];
  const found = new Set(tries.flatMap((each) => [...shapes].flatMap((shape) => fitted(each, shape) ?? [])));
  const [only] = found;
  return found.size === 1 && only !== undefined ? { text: only, sure: false } : null;
}

const mostSwaps = 2;

/** The text with look-alikes put in where its shape differs; null where that does not do. */
function fitted(text: string, shape: string): string | null {
  if (text.length !== shape.length) return null;
  let swaps = 0;
  let made = '';
  for (const [at, wanted] of [...shape].entries()) {
    const letter = text.charAt(at);
    const as = shapeOf(letter) === wanted ? letter : likeFor(wanted)[letter];
    if (as === undefined || (wanted !== '9' && wanted !== 'A' && as !== wanted)) return null;
    if (as !== letter) swaps += 1;
    made += as;
  }
  return swaps <= mostSwaps ? made : null;
}

const likeFor = (wanted: string): Record<string, string> =>
  wanted === '9' ? figureLike : wanted === 'A' ? capitalLike : signLike;

/** Puts the points and commas of the column's one shape into a number that has lost or bent them. */
export function mendPunctuation(text: string, shapes: ReadonlySet<string>): Mended | null {
  if (shapes.has(shapeOf(text))) return null;
  const digits = text.replace(/\D/g, '');
  if (digits === '' || /[A-Za-z]/.test(text)) return null;
  const fitting = [...shapes].filter((shape) => shape.replace(/\D/g, '').length === digits.length);
  const [shape] = fitting;
  if (fitting.length !== 1 || shape === undefined) return null;
  let next = 0;
  return { text: shape.replace(/9/g, () => digits.charAt(next++)), sure: false };
}
