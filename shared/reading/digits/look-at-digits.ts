import { type Zone, zoneAround } from '#shared/document/define-block.ts';
import { findTables } from '#shared/reading/find-tables.ts';
import { median, rightOf } from '#shared/reading/lines.ts';
import { type GreyPicture, inkThreshold } from '#shared/reading/picture/grey.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import { withoutSpecks } from '#shared/reading/specks.ts';
import { type DigitSize, digitBoxes, gridOf, inkStretches } from './cut-digits.ts';
import { type Likenesses, type Sample, type Looks, likenessesOf, mostLike, ratherThan } from './digit-shapes.ts';
import { cutOut, evenly, middleBand, withoutUnderline } from './piece.ts';

/** A number as a cell of a table has it. */
const isNumber = (text: string): boolean => /^[$(+±-]?[\d.,]*\d[\d.,]*[%)]?$/.test(text);
const isDigits = (text: string): boolean => /^\d+$/.test(text);
/** Where so many of a column's numbers are digits alone, all are. */
const mostlyPlain = 0.8;
/** So many of a column's cells must be numbers, and so many cells there must be. */
const leastNumbers = 0.6;
const fewestCells = 3;
/** With fewer figures on the page nothing is known of their looks. */
const fewestFigures = 60;
/** A figure that is so much higher, lower or wider than the others says nothing of their looks. */
const mostOff = 0.25;
/** A figure that looks like none of the page's digits so much is none. */
const leastLikeness = 0.8;
/** What the picture must say for another digit than the one read, as a share of what tells the two apart. */
const clearly = 0.5;
/** Words of one cell that stand closer than this, in pitches of the figures, are one number in pieces. */
const oneNumber = 0.9;
/** What is surely read as letters is no number. */
const surelyWord = 85;

/** `isPlain`: the numbers of its column are digits alone. */
type Cell = { words: readonly ReadingWord[]; text: string; isPlain: boolean };
type Cut = Cell & { piece: GreyPicture; boxes: Zone[] };
type Looked = Cell & { found: Likenesses[]; looks: Looks };
/** `threshold` parts ink from paper. */
type Page = { picture: GreyPicture; scale: number; threshold: number };

/**
 * Looks at the figures of a page's tables once more, each beside all others: in one typeface all 3s look the same, and a
 * flat-topped 3 that the engine takes for a 5 looks like those that it did not. Cells whose picture says so get what it
 * shows as `seen`. Words' boxes are those of the page as shown; the picture is `scale` times as large, paper white.
 */
export function withDigitsLookedAt(
  words: readonly ReadingWord[],
  { picture, scale }: { picture: GreyPicture; scale: number },
): ReadingWord[] {
  const page = { picture, scale, threshold: inkThreshold(picture) };
  const cells = numberCells(words);
  const size = sizeOf(cells, page);
  if (size === null) return [...words];
  const seen = new Map<ReadingWord, ReadingWord | null>();
  for (const cell of lookedAtCells(cells, size, page)) {
    const number = numberIn(cell);
    const [first, ...rest] = cell.words;
    if (number === null || first === undefined) continue;
    seen.set(first, joined(cell, number));
    for (const word of rest) seen.set(word, null);
  }
  return words.flatMap((word) => {
    const now = seen.get(word);
    return now === undefined ? [word] : now === null ? [] : [now];
  });
}

function joined({ words, text }: Cell, seen: string): ReadingWord {
  const [first = { text: '', raw: '', confidence: 0, box: [0, 0, 0, 0], line: 0, block: 0 }] = words;
  const confidence = Math.min(...words.map((word) => word.confidence));
  return { ...first, text, raw: text, seen, confidence, box: zoneAround(words.map(({ box }) => box)) };
}

/** The filled cells of columns of numbers. */
const numberCells = (words: readonly ReadingWord[]): Cell[] =>
  findTables(withoutSpecks(words)).flatMap(({ rows, columns }) =>
    columns.flatMap((_, column) => {
      const cells = rows
        .map((row) => row.cells[column] ?? [])
        .filter((cell) => cell.length > 0)
        .map((cell) => ({ words: cell, text: cell.map(({ text }) => text).join('') }));
      const numbers = cells.filter(({ text }) => isNumber(text));
      if (numbers.length < fewestCells || numbers.length < cells.length * leastNumbers) return [];
      const isPlain = numbers.filter(({ text }) => isDigits(text)).length >= numbers.length * mostlyPlain;
      return cells.map((cell) => ({ ...cell, isPlain }));
    }),
  );

function sizeOf(cells: readonly Cell[], page: Page): DigitSize | null {
  const plain = cells.filter(({ text }) => /^\d{2,}$/.test(text));
  // The highest of a cell: between its figures there may be specks.
  const heights = plain.map((cell) => Math.max(...inkStretches(middleBand(pieceOf(cell, page))).map(([, , , h]) => h)));
  const pitches = plain.map(({ words, text }) => (zoneOf(words)[2] * page.scale) / text.length);
  const figures = plain.reduce((sum, { text }) => sum + text.length, 0);
  return figures < fewestFigures ? null : { height: median(heights), pitch: median(pitches) };
}

const zoneOf = (words: readonly ReadingWord[]): Zone => zoneAround(words.map(({ box }) => box));

const pieceOf = ({ words }: Cell, { picture, scale, threshold }: Page): GreyPicture => {
  const [x, y, w, h] = zoneOf(words).map((each) => each * scale) as Zone;
  const beyond = h * 0.15;
  return evenly(cutOut(picture, [x - beyond, y, w + 2 * beyond, h].map(Math.round) as Zone), threshold);
};

function lookedAtCells(cells: readonly Cell[], size: DigitSize, page: Page): Looked[] {
  const cut = cells.map((cell): Cut => {
    const piece = withoutUnderline(middleBand(pieceOf(cell, page)), size.height);
    return { ...cell, piece, boxes: digitBoxes(piece, size) };
  });
  const { found, looks } = likenessesOf(cut.flatMap((cell) => samplesOf(cell, size)));
  let next = 0;
  return cut
    .map((cell) => ({ ...cell, looks, found: cell.boxes.map(() => found[next++] ?? new Map<string, number>()) }))
    .filter(({ words }) => isOneNumber(words, size.pitch / page.scale));
}

const isOneNumber = (words: readonly ReadingWord[], pitch: number): boolean =>
  words.every(({ box }, at) => at === 0 || box[0] - rightOf(words[at - 1]?.box ?? box) < pitch * oneNumber);

const lettersIn = (text: string): string => text.replace(/[^0-9A-Za-z]/g, '');

function samplesOf({ text, words, piece, boxes }: Cut, { height, pitch }: DigitSize): Sample[] {
  const letters = lettersIn(text);
  const weight = Math.max(0.05, Math.min(...words.map(({ confidence }) => confidence)) / 100);
  return boxes.map((box, at) => {
    const read = letters.length === boxes.length ? letters.charAt(at) : '';
    const isWhole = Math.abs(box[3] / height - 1) < mostOff && box[2] < pitch * (1 + mostOff);
    return { grid: gridOf(piece, box, height), read: isDigits(read) && isWhole ? read : '', weight };
  });
}

/** The number that the picture of a cell shows; null where it cannot be told or is as it was read. */
function numberIn({ text, words, isPlain, found, looks }: Looked): string | null {
  const shown = found.map(mostLike);
  if (shown.length === 0 || found.some((each, at) => (each.get(shown[at] ?? '') ?? -1) < leastLikeness)) return null;
  if (/^[A-Za-z]+$/.test(text) && words.every(({ confidence }) => confidence >= surelyWord)) return null;
  const digits = text.replace(/\D/g, '');
  const better = shown.map((digit, at) => {
    const read = digits.length === shown.length ? digits.charAt(at) : digit;
    return ratherThan(found[at] ?? new Map<string, number>(), looks, [digit, read]) < clearly ? read : digit;
  });
  if (isPlain && !/\d[.,]\d/.test(text)) return different(better.join(''), text);
  if (!isNumber(text) || digits.length !== shown.length) return null;
  let next = 0;
  return different(
    text.replace(/\d/g, (digit) => better[next++] ?? digit),
    text,
  );
}

const different = (number: string, text: string): string | null => (number === text ? null : number);
