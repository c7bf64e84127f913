import type { Mended } from './mended.ts';
import type { ReadingWord } from './reading.ts';

/** Channels count up and frequencies rise by the channel spacing; so many of the steps must be the same to say so. */
const leastEvenSteps = 0.7;
const fewestSteps = 6;
/** What was read with more confidence stands, and is for a person to compare. */
const doubtfulBelow = 85;
const mostChangedFigures = 2;

type Cells = readonly (readonly ReadingWord[])[];
type Figure = { word: ReadingWord; text: string; value: number | null };

/** In a column of even steps a doubtful figure that breaks the row becomes the one that fits, as a guess. */
export function mendSeries(
  cells: Cells,
  before: ReadonlyMap<ReadingWord, Mended> = new Map(),
): Map<ReadingWord, Mended> {
  const figures = cells.map((cell): Figure | null => {
    const [word] = cell;
    if (word === undefined) return null;
    const text = before.get(word)?.text ?? word.text;
    const isNumber = /^\d{1,3}(,\d{3})*(\.\d+)?$|^\d+(\.\d+)?$/.test(text);
    return { word, text, value: isNumber ? Number(text.replaceAll(',', '')) : null };
  });
  const step = evenStep(figures);
  const changes = new Map<ReadingWord, Mended>();
  if (step === null) return changes;
  figures.forEach((figure, row) => {
    if (figure === null || figure.word.confidence >= doubtfulBelow) return;
    const expected = expectedAt(figures, row, step);
    if (expected === null || fits(figure.value, expected, step)) return;
    const text = writtenLike(figure, expected, figures);
    if (text !== null) changes.set(figure.word, { text, sure: false });
  });
  return changes;
}

function evenStep(figures: readonly (Figure | null)[]): number | null {
  const steps = figures.slice(1).flatMap((figure, row) => {
    const [from, to] = [figures[row]?.value ?? null, figure?.value ?? null];
    return from === null || to === null ? [] : [to - from];
  });
  const sorted = [...steps].sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)];
  if (middle === undefined || middle === 0 || steps.length < fewestSteps) return null;
  const even = steps.filter((step) => Math.abs(step - middle) <= Math.abs(middle) * 0.02);
  return even.length >= steps.length * leastEvenSteps ? middle : null;
}

/** What the rows above and below, both, make one expect; null where they disagree or there is one only. */
function expectedAt(figures: readonly (Figure | null)[], row: number, step: number): number | null {
  const [above, below] = [figures[row - 1]?.value ?? null, figures[row + 1]?.value ?? null];
  if (above === null || below === null) return null;
  return Math.abs(below - above - 2 * step) <= Math.abs(step) * 0.04 ? (above + below) / 2 : null;
}

const fits = (value: number | null, expected: number, step: number): boolean =>
  value !== null && Math.abs(value - expected) <= Math.abs(step) * 0.04;

/** The figure written as its neighbours are; rounding may differ in the last place, so one or two figures are changed at most. */
function writtenLike({ text, value }: Figure, expected: number, figures: readonly (Figure | null)[]): string | null {
  const pattern = figures.find((each) => each !== null && each.value !== null)?.text ?? text;
  const decimals = pattern.includes('.') ? pattern.length - pattern.indexOf('.') - 1 : 0;
  const plain = expected.toFixed(decimals);
  const grouped = pattern.includes(',') ? plain.replace(/\B(?=(\d{3})+(?!\d))(?=.*\.)/g, ',') : plain;
  if (decimals === 0) return grouped;
  if (value === null || grouped.length !== text.length) return null;
  const changed = [...grouped].filter((letter, at) => letter !== text.charAt(at)).length;
  return changed <= mostChangedFigures ? grouped : null;
}
