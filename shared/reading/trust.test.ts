import { describe, expect, it } from 'vitest';
import { trustIn } from './trust.ts';
import { readWords } from './words.fixture.ts';

const trustOf = (text: string, changes: { raw?: string; sure?: boolean } = {}): number =>
  readWords([text]).map((word) => trustIn({ ...word, ...changes }))[0] ?? 0;

// Words as they were read from generated pages; the fixture's confidence is 95.
describe('trust in a word', () => {
  it.each(['ADJUST', '4,832.5', 'mc', 'R515', '.01', 'Q2', 'V1-V4', 'of', 'kHz', 'dB', 'd.c.', '2.1.3', '23,614.2'])(
    'is the confidence of %s',
    (text) => {
      expect(trustOf(text)).toBe(95);
    },
  );

  it.each(['me', 'v2el', '£2,', 'vé', '0SC', '75:5', 'tO', 'german.um', 'VARIABL:,', 'C3.C5', '0,022', '23.614.2'])(
    'is less in %s, which hardly stands in print',
    (text) => {
      expect(trustOf(text)).toBeLessThan(90);
    },
  );

  it('is less in a sign that was guessed, not in one that the grammar leaves no choice for', () => {
    expect(trustOf('µh', { raw: 'uh', sure: false })).toBeLessThan(95);
    expect(trustOf('kc', { raw: 'ke', sure: true })).toBe(95);
  });
});
