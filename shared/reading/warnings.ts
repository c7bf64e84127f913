import type { PictureQuality } from './picture/quality.ts';
import type { ReadingWarning, WarningKind } from './page-warning.ts';
import type { Reading, ReadingWord } from './reading.ts';
import { withoutSpecks } from './specks.ts';

export type Evidence = {
  /** Dots an inch of the scan as delivered. */
  dpi: number;
  quality: PictureQuality;
  words: readonly ReadingWord[];
  /** Mean confidence by letters, 0 to 100. */
  confidence: number;
};

// Limits lie between generated scans that read well and those that do not: ones of good and medium quality at 300 dots an
// inch keep clear of all of them, bad ones are over two or three.
const coarseBelowDpi = 180;
const softAbovePixels = 6.8;
const faintBelow = 72;
const speckledAbove = 30;
const unevenAbove = 80;
const doubtfulBelow = 80;

/** The warnings about a page, the picture's first. */
export function warningsOf({ dpi, quality, words, confidence }: Evidence): ReadingWarning[] {
  const isBlank = isNearlyBlank(quality, words);
  const rows: readonly [WarningKind, boolean, string][] = [
    ['nearly-blank', isBlank, `${(quality.inkShare * 100).toFixed(2)} % of the page is ink`],
    ['low-resolution', dpi < coarseBelowDpi, `${Math.round(dpi)} dots an inch`],
    ['soft', !isBlank && quality.edgePixels > softAbovePixels, `edges ${quality.edgePixels.toFixed(1)} pixels wide`],
    ['faint', !isBlank && quality.contrast < faintBelow, `contrast ${Math.round(quality.contrast)} of 255`],
    [
      'speckled',
      quality.specksPerSquareInch > speckledAbove,
      `${Math.round(quality.specksPerSquareInch)} specks a square inch`,
    ],
    ['uneven', quality.paperSpread > unevenAbove, `paper differs by ${Math.round(quality.paperSpread)} of 255`],
    ['low-confidence', !isBlank && confidence < doubtfulBelow, `mean confidence ${Math.round(confidence)}`],
  ];
  return rows.flatMap(([kind, holds, detail]) => (holds ? [{ kind, detail }] : []));
}

/** The warnings about a page that no turn made clearly better; a blank page lies as it may. */
export function withTurnUnsure({
  warnings = [],
  confidence,
}: Pick<Reading, 'warnings' | 'confidence'>): ReadingWarning[] {
  if (warnings.some(({ kind }) => kind === 'nearly-blank')) return warnings;
  return [{ kind: 'turn-unsure', detail: `mean confidence ${Math.round(confidence)} as it lies` }, ...warnings];
}

/** A page of print inks 3 % and more; a lone page number and dirt come to less than this. */
const littleInk = 0.004;
const fewLetters = 12;
const surelyWord = 70;

/** Whether a page bears no print but perhaps a page number: little ink, and hardly a letter that was read surely. */
export function isNearlyBlank({ inkShare, contrast }: PictureQuality, words: readonly ReadingWord[]): boolean {
  const letters = surelyRead(words).reduce((sum, { text }) => sum + text.length, 0);
  return letters < fewLetters && (inkShare < littleInk || contrast < grainBelow || words.length === 0);
}

/** Where there is no ink, the threshold parts paper from its own grain. */
const grainBelow = 40;

/** On a page that is nearly blank what was read with doubt is dirt. */
export const surelyRead = (words: readonly ReadingWord[]): ReadingWord[] =>
  withoutSpecks(words).filter(({ confidence, text }) => confidence >= surelyWord && /[\p{L}\p{N}]/u.test(text));
