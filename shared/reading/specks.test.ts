import { describe, expect, it } from 'vitest';
import { withoutSpecks } from './specks.ts';
import { readWords } from './words.fixture.ts';

const textsOf = (words: readonly { text: string }[]): string[] => words.map(({ text }) => text);

describe('what the edge of the sheet was read as', () => {
  const list = readWords([
    '     C12  Capacitor, mica     1',
    '     C13  Capacitor, paper    2',
    '     R14  Resistor, carbon    1',
  ]);
  /** One letter a line, left of all print. */
  const beside = (texts: string[], confidence: number) =>
    texts.map((text, at) => ({
      ...list[0]!,
      text,
      raw: text,
      confidence,
      box: [20, 400 + at * 50, 12, 30] as [number, number, number, number],
      line: at,
    }));

  it('is left out where the engine trusts none of it', () => {
    expect(textsOf(withoutSpecks([...beside(['i', 'E', 'l'], 8), ...list]))).toEqual(textsOf(list));
  });

  it('is no column of markers, which are trusted', () => {
    const marked = [...beside(['1', '2', '3'], 92), ...list];
    expect(textsOf(withoutSpecks(marked))).toEqual(textsOf(marked));
  });
});
