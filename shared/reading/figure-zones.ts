import { type Zone, zoneAround } from '#shared/document/define-block.ts';
import { classifyLine } from './classify-line.ts';
import { type Line, bottomOf, lineText, median, middleOf, rightOf, rowsByHeight, segmentsOf } from './lines.ts';
import { overlap } from './picture/figures.ts';
import type { ReadingWord } from './reading.ts';

/** A line with so many words, most of them of letters, none far from the next, is running text and no row of labels. */
const fewestWords = 5;
const widestGapLetters = 1.6;
const leastWordy = 0.5;
const leastConfidence = 65;
/** What follows running text so closely, in letter heights, goes on with it: the last line of a paragraph. */
const closeLetters = 0.8;
/** Above its caption a drawing takes at least so much room, even where none of its strokes was taken for one. */
const leastDrawingInches = 0.8;

/**
 * Drawings made whole: what stands between the running text above and the caption below is one drawing, with its labels.
 * A drawing without a caption stays as it was found.
 */
export function wholeFigures(found: readonly Zone[], words: readonly ReadingWord[], dpi: number): Zone[] {
  const letter = median(words.map(({ box }) => box[3]));
  const rows = rowsByHeight(words);
  const barriers = textRows(rows, letter);
  const whole = rows.filter(isCaption).flatMap((caption) => {
    const above = barriers.filter(({ zone }) => bottomOf(zone) <= caption.zone[1] && zone !== caption.zone).at(-1);
    const top = above === undefined ? 0 : bottomOf(above.zone);
    const isInside = (zone: Zone): boolean => middleOf(zone) > top && middleOf(zone) < caption.zone[1];
    const own = found.filter(isInside);
    const labels = words.map(({ box }) => box).filter(isInside);
    const isTall = above !== undefined && caption.zone[1] - top >= leastDrawingInches * dpi;
    if (own.length === 0 && !(isTall && labels.length > 0)) return [];
    const room = own.length === 0 ? roomBetween(above, caption, letter) : [];
    return [within(zoneAround([...own, ...labels, ...room]), top, caption.zone[1])];
  });
  return [...whole, ...found.filter((zone) => !whole.some((other) => overlap(zone, other) > 0.5))];
}

/** A zone without what of it lies above `top` or from `bottom` on: the strokes found may reach into the text. */
function within([x, y, w, h]: Zone, top: number, bottom: number): Zone {
  const from = Math.max(y, top + 1);
  return [x, from, w, Math.max(1, Math.min(y + h, bottom - 1) - from)];
}

/** The room between text and caption, for a drawing of which only labels are known. */
function roomBetween(above: Line | undefined, caption: Line, letter: number): Zone[] {
  if (above === undefined) return [];
  const [left, right] = [
    Math.min(above.zone[0], caption.zone[0]),
    Math.max(rightOf(above.zone), rightOf(caption.zone)),
  ];
  const top = bottomOf(above.zone) + letter * 0.5;
  return [[left, top, right - left, Math.max(1, caption.zone[1] - letter * 0.5 - top)].map(Math.round) as Zone];
}

const isCaption = (line: Line): boolean => {
  const kind = classifyLine(line);
  return kind.kind === 'caption' && kind.of === 'figure' && !/[,;]$/.test(lineText(line));
};

/** Rows that no drawing has: running text, its last lines, captions and numbered headings. */
function textRows(rows: readonly Line[], letter: number): Line[] {
  return rows.reduce<Line[]>((text, row) => {
    const last = text.at(-1);
    const goesOn = last !== undefined && row.zone[1] - bottomOf(last.zone) < letter * closeLetters && isConfident(row);
    return isRunning(row, letter) || goesOn || isCaption(row) || isHeading(row) ? [...text, row] : text;
  }, []);
}

const isHeading = (row: Line): boolean =>
  classifyLine(row).kind === 'heading' && /^\d+[-–.]\d+[.,]?$/.test(row.words[0]?.text ?? '');

const isConfident = ({ words }: Line): boolean => median(words.map(({ confidence }) => confidence)) >= leastConfidence;

function isRunning(row: Line, letter: number): boolean {
  const { words } = row;
  const wordy = words.filter(({ text }) => /[A-Za-z]{2}/.test(text)).length;
  return (
    words.length >= fewestWords &&
    wordy >= words.length * leastWordy &&
    segmentsOf(row, letter * widestGapLetters).length === 1 &&
    isConfident(row)
  );
}
