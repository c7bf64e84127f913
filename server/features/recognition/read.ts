import { readFile } from 'node:fs/promises';
import type { Zone } from '#shared/document/define-block.ts';
import { mendBullets } from '#shared/reading/bullets.ts';
import { inReadingOrder } from '#shared/reading/columns.ts';
import { findTables, isWellFilled } from '#shared/reading/find-tables.ts';
import { wholeFigures } from '#shared/reading/figure-zones.ts';
import { withDigitsLookedAt } from '#shared/reading/digits/look-at-digits.ts';
import { lookedAt } from '#shared/reading/glyphs/look.ts';
import { mendTables } from '#shared/reading/mend-tables.ts';
import { findFigures, overlap } from '#shared/reading/picture/figures.ts';
import { unreadMargins } from '#shared/reading/picture/margins.ts';
import { gutterOf } from '#shared/reading/picture/spread.ts';
import { type Reading, type ReadingWord, type RecipeWish, meanConfidence } from '#shared/reading/reading.ts';
import { repairWords } from '#shared/reading/repair.ts';
import { chooseWords, textLayer } from '#shared/reading/text-layer.ts';
import type { ReadingWarning } from '#shared/reading/page-warning.ts';
import { withoutSpecks } from '#shared/reading/specks.ts';
import { isNearlyBlank, surelyRead, warningsOf, withTurnUnsure } from '#shared/reading/warnings.ts';
import { engineName, recognise } from './engine.ts';
import { type Prepared, prepare } from './prepare.ts';
import { uprightTurn } from './upright.ts';
import { readMargins, rereadCells, rereadFigures } from './reread.ts';

export type ReadInput = {
  drawn: string;
  dpi: number;
  target: string;
  wish: RecipeWish;
  /** The words that the source itself carries for the page, as JSON; null where it has none. */
  layer?: string | null;
};

/** A drawing has a few labels; a zone that words fill to this share is text that stands close together. */
const mostWordsInFigure = 0.22;

/**
 * Below this confidence a page may lie on its side or upside down: six generated ones came to 35 at most, upright ones
 * of fair quality to more than 80.
 */
const uprightAbove = 65;

/** Reads one drawn page: sets it upright, straightens it, writes the page image to `target`, recognises its words. Runs in a worker process. */
export async function readPage(input: ReadInput): Promise<Reading> {
  const { drawn, dpi, wish } = input;
  const reading = await readAsItLies(input);
  if (wish.turnDegrees !== undefined || reading.confidence >= uprightAbove || isBlank(reading)) return reading;
  const { turn: turnDegrees, isSure } = await uprightTurn(drawn, dpi);
  if (turnDegrees !== 0) return readAsItLies({ ...input, wish: { ...wish, turnDegrees } });
  return isSure ? reading : { ...reading, warnings: withTurnUnsure(reading) };
}

const isBlank = ({ warnings = [] }: Reading): boolean => warnings.some(({ kind }) => kind === 'nearly-blank');

async function readAsItLies({ drawn, dpi, target, wish, layer = null }: ReadInput): Promise<Reading> {
  const prepared = await prepare(drawn, dpi, { target, wish });
  const { shown, segmentation, transform } = prepared;
  const looked = await secondLooks(prepared, await recognisedWords(prepared));
  const { quality } = prepared;
  const { figures } = looked;
  const hasNothing = figures.length === 0 && isNearlyBlank(quality, looked.words);
  const filed = layer === null ? null : textLayer.parse(JSON.parse(await readFile(layer, 'utf8')));
  const read = hasNothing ? surelyRead(looked.words) : looked.words;
  const { words, wordsFrom, warnings } = chooseWords(read, filed, { transform, wish: wish.wordsFrom });
  const confidence = meanConfidence(words);
  return {
    recipe: {
      engine: engineName,
      language: 'eng',
      segmentation,
      dpi: shown.dpi,
      skewDegrees: prepared.skew,
      rulesRemoved: prepared.rulesRemoved,
      flattened: prepared.flattened,
      turnDegrees: wish.turnDegrees ?? 0,
      ...(filed === null ? {} : { wordsFrom }),
    },
    confidence,
    width: shown.width,
    height: shown.height,
    transform,
    words,
    figures,
    warnings: [...warningsOf({ dpi, quality, words, confidence }), ...warnings, ...spreadWarning(prepared)],
  };
}

function spreadWarning({ coarse, coarseScale, shown }: Prepared): ReadingWarning[] {
  const at = gutterOf(coarse, shown.dpi / coarseScale);
  return at === null
    ? []
    : [{ kind: 'double-page', detail: `they seem to meet at ${Math.round(at * 100)} % of the width` }];
}

const dpiForEngine = ({ shown, scale }: Prepared): number => Math.round(shown.dpi * scale);

async function recognisedWords(prepared: Prepared): Promise<ReadingWord[]> {
  const { segmentation, scale } = prepared;
  const read = await recognise(prepared.picture, { segmentation, dpi: dpiForEngine(prepared) });
  const printed = read.filter(({ text }) => text.trim() !== '');
  return lookedAt(printed, prepared.clean).map((word) => ({ ...word, box: scaled(word.box, 1 / scale) }));
}

/** Doubtful cells, drawings and passed-over margins are read on their own; then the whole is mended. */
async function secondLooks(
  prepared: Prepared,
  read: readonly ReadingWord[],
): Promise<{ words: ReadingWord[]; figures: Zone[] }> {
  const { scale, clean, lined } = prepared;
  const page = { picture: clean, scale, dpi: dpiForEngine(prepared) };
  const withMargins = await readMargins(read, unreadIn(prepared, read), page);
  const withCells = withDigitsLookedAt(await rereadCells(withMargins, page), page);
  const repaired = repairWords(withCells);
  const figures = wholeFigures(figuresOf(prepared, repaired), withoutSpecks(repaired), prepared.shown.dpi);
  const labelled = await rereadFigures(withCells, figures, { ...page, picture: lined });
  return { words: mendBullets(inReadingOrder(mendTables(repairWords(labelled)), figures)), figures };
}

function unreadIn({ coarseClean, coarseScale, shown }: Prepared, words: readonly ReadingWord[]): Zone[] {
  const boxes = words.map(({ box }) => scaled(box, 1 / coarseScale));
  return unreadMargins(coarseClean, shown.dpi / coarseScale, boxes).map((zone) => scaled(zone, coarseScale));
}

const scaled = (box: Zone, by: number): Zone => box.map((each) => Math.round(each * by)) as Zone;

/** Words that are surely words; what the engine made of the strokes of a drawing is not. */
const surelyWord = 60;

function figuresOf({ coarse, coarseScale, shown }: Prepared, words: readonly ReadingWord[]): Zone[] {
  const toCoarse = (zone: Zone): Zone => scaled(zone, 1 / coarseScale);
  const tables = findTables(withoutSpecks(words))
    .filter(isWellFilled)
    .map(({ zone }) => toCoarse(zone));
  const sure = words.filter(({ confidence }) => confidence >= surelyWord).map(({ box }) => toCoarse(box));
  return findFigures(coarse, shown.dpi / coarseScale, { words: sure, tables })
    .map((zone) => scaled(zone, coarseScale))
    .filter((zone) => words.reduce((sum, { box }) => sum + overlap(zone, box), 0) < mostWordsInFigure);
}
