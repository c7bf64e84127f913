import { describe, expect, it } from 'vitest';
import type { PictureQuality } from './picture/quality.ts';
import { type Evidence, warningsOf, withTurnUnsure } from './warnings.ts';
import { readWords } from './words.fixture.ts';

const good: PictureQuality = {
  contrast: 141,
  paperSpread: 34,
  edgePixels: 3.1,
  specksPerSquareInch: 0.4,
  inkShare: 0.06,
};
const words = readWords(['ADJUST THE SLUG OF T5 FOR MAXIMUM OUTPUT']);
const kindsOf = (evidence: Partial<Evidence>): string[] =>
  warningsOf({ dpi: 300, quality: good, words, confidence: 94, ...evidence }).map(({ kind }) => kind);

describe('warnings about a page', () => {
  it('says nothing about a fair scan', () => {
    expect(kindsOf({})).toEqual([]);
  });

  // The figures are those of generated scans, one fault each.
  it.each([
    ['low-resolution', { dpi: 150 }],
    ['soft', { quality: { ...good, edgePixels: 8 } }],
    ['faint', { quality: { ...good, contrast: 63 } }],
    ['speckled', { quality: { ...good, specksPerSquareInch: 58 } }],
    ['uneven', { quality: { ...good, paperSpread: 92 } }],
    ['low-confidence', { confidence: 71 }],
  ] as const)('names a page that is %s', (kind, evidence) => {
    expect(kindsOf(evidence)).toEqual([kind]);
  });

  it('knows a page that bears no more than its number', () => {
    const number = readWords(['27']);
    expect(kindsOf({ words: number, quality: { ...good, inkShare: 0.0004 }, confidence: 0 })).toEqual(['nearly-blank']);
  });

  it('is unsure of the turn of a page with print, not of a blank one', () => {
    expect(withTurnUnsure({ confidence: 41 }).map(({ kind }) => kind)).toEqual(['turn-unsure']);
    const blank = [{ kind: 'nearly-blank' as const, detail: '' }];
    expect(withTurnUnsure({ confidence: 0, warnings: blank })).toEqual(blank);
  });
});
