import { z } from 'zod';
import { type Zone, zone, zoneAround } from '#shared/document/define-block.ts';
import { between } from '#shared/document/zones.ts';
import { linesOf, median, middleOf, rightOf, rowsByHeight } from './lines.ts';
import type { ReadingWord, Recipe, Transform } from './reading.ts';
import type { ReadingWarning } from './page-warning.ts';

/** The words that a file itself carries for a page. Boxes are in pixels of the picture as drawn. */
export const textLayer = z.object({
  words: z.array(z.object({ text: z.string(), box: zone })),
  /** They are what is painted; not painted, they lie hidden behind a scan and are another program's reading of it. */
  isPainted: z.boolean(),
});
export type TextLayer = z.infer<typeof textLayer>;

/** What a file says of itself is surer than any reading, but a hand-made file may lie: not 100. */
const layerConfidence = 99;
/** Words that recognition is sure of and that are long enough not to agree by chance. */
const surelyRead = 88;
const fewestLetters = 3;
/** With fewer such words there is nothing to check against. */
const fewestChecks = 8;

const asDrawn: Transform = [
  [1, 0, 0],
  [0, 1, 0],
];

/** The layer's words where they lie in the picture as read, whose `transform` takes its points to the picture as drawn. */
function layerWords({ words }: TextLayer, transform: Transform): ReadingWord[] {
  const [[a, b, c], [d, e, f]] = between(asDrawn, transform);
  return words.map(({ text, box: [x, y, w, h] }) => {
    const corners = [
      [x, y],
      [x + w, y],
      [x, y + h],
      [x + w, y + h],
    ].map(([px = 0, py = 0]): Zone => [a * px + b * py + c, d * px + e * py + f, 0, 0]);
    const box = zoneAround(corners).map(Math.round) as Zone;
    return { text, raw: text, confidence: layerConfidence, box, line: 0, block: 0 };
  });
}

/**
 * How far a layer says what is printed: of the words that recognition read surely, the share that the layer has at the
 * same place, 0 to 1. Null where too few were read to tell.
 */
function agreement(read: readonly ReadingWord[], layer: TextLayer, transform: Transform): number | null {
  const own = layerWords(layer, transform);
  const checked = read.filter(
    ({ text, confidence }) => confidence >= surelyRead && text.replace(/\W/g, '').length >= fewestLetters,
  );
  if (checked.length < fewestChecks) return null;
  const agreeing = checked.filter((word) => {
    const there = own.filter(({ box }) => middleWithin(box, word.box)).map(({ text }) => text);
    return level(there.join('')) === level(word.text);
  });
  return agreeing.length / checked.length;
}

const level = (text: string): string =>
  text
    .normalize('NFKC')
    .replace(/[^\p{L}\p{N}]/gu, '')
    .toLowerCase();

const middleWithin = ([x, y, w, h]: Zone, [ox, oy, ow, oh]: Zone, slack = 0): boolean =>
  x + w / 2 >= ox - slack && x + w / 2 <= ox + ow + slack && y + h / 2 >= oy && y + h / 2 <= oy + oh;

/**
 * The words read, with the layer's words in their place. Lines keep the order in which they were read; where the layer
 * has none, as in the lettering of a picture, the words read stay. Words that only the layer has become lines of their own.
 */
function withLayer(read: readonly ReadingWord[], layer: TextLayer, transform: Transform): ReadingWord[] {
  const own = layerWords(layer, transform);
  const taken = new Set<ReadingWord>();
  const words = linesOf(read).flatMap(({ words: printed, zone: around }) => {
    const letter = median(printed.map(({ box }) => box[3]));
    const mine = own.filter((word) => !taken.has(word) && middleWithin(word.box, around, letter));
    for (const word of mine) taken.add(word);
    // Words of the line that the layer lacks are another's: a picture set into the line.
    const rest = mine.length === 0 ? printed : printed.filter(({ box }) => !mine.some((word) => covers(word.box, box)));
    const { line = 0, block = 0 } = printed[0] ?? {};
    return [...mine, ...rest].sort((a, b) => a.box[0] - b.box[0]).map((word) => ({ ...word, line, block }));
  });
  return withOwnLines(
    words,
    own.filter((word) => !taken.has(word)),
  );
}

const covers = ([x, , w]: Zone, [ox, , ow]: Zone): boolean => Math.min(x + w, ox + ow) - Math.max(x, ox) > ow * 0.3;

/** Puts each line that only the layer has behind the line that was read above it. */
function withOwnLines(words: readonly ReadingWord[], missing: readonly ReadingWord[]): ReadingWord[] {
  const placed = [...words];
  let line = Math.max(0, ...words.map((word) => word.line));
  for (const { words: own, zone: around } of rowsByHeight(missing)) {
    line += 1;
    const above = placed.findLastIndex(({ box }) => middleOf(box) < middleOf(around) && sharesWidth(box, around));
    const { block = 0, line: lineAbove = -1 } = placed[above] ?? {};
    const at =
      Math.max(
        above,
        placed.findLastIndex((word) => word.line === lineAbove),
      ) + 1;
    placed.splice(at, 0, ...own.map((word) => ({ ...word, line, block })));
  }
  return placed;
}

const sharesWidth = (a: Zone, b: Zone): boolean => rightOf(a) > b[0] && a[0] < rightOf(b);

/** A painted layer that agrees less than this with the picture says something else than it shows. */
const agrees = 0.8;

export type ChosenWords = { words: ReadingWord[]; wordsFrom: 'picture' | 'file'; warnings: ReadingWarning[] };

/**
 * Whose words a page takes: the file's where they are what is painted and agree with the picture, else those read. A layer
 * hidden behind a scan is another program's reading, of unknown worth: it is taken only when asked for.
 */
export function chooseWords(
  read: ReadingWord[],
  layer: TextLayer | null,
  { transform, wish }: { transform: Transform; wish: Recipe['wordsFrom'] },
): ChosenWords {
  const asRead: ChosenWords = { words: read, wordsFrom: 'picture', warnings: [] };
  if (layer === null || wish === 'picture') return asRead;
  const asFiled: ChosenWords = { words: withLayer(read, layer, transform), wordsFrom: 'file', warnings: [] };
  if (wish === 'file') return asFiled;
  if (!layer.isPainted) return asRead;
  const share = agreement(read, layer, transform) ?? 1;
  if (share >= agrees) return asFiled;
  const detail = `${Math.round(share * 100)} % of the words that were read surely stand in the file's own text`;
  return { ...asRead, warnings: [{ kind: 'text-differs', detail }] };
}
