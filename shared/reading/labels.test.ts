import { describe, expect, it } from 'vitest';
import { mergedLabels } from './labels.ts';
import { readWords } from './words.fixture.ts';

describe('the lettering of a drawing', () => {
  const page = readWords(['MlXER V258'], { MlXER: 40 });
  const merged = (line: string, confidences: Record<string, number>): string[] =>
    mergedLabels(page, readWords([line], confidences), [250, 380, 1200, 80]).map(({ text }) => text);

  it('is the surer of two readings of the same print', () => {
    expect(merged('MIXER V25B', { MIXER: 90, V25B: 60 })).toEqual(['V258', 'MIXER']);
  });

  it('takes what only one reading has when that is sure, and no strokes', () => {
    expect(merged('            455 ii ||', { '455': 90, ii: 40, '||': 95 })).toEqual(['MlXER', 'V258', '455']);
  });
});
