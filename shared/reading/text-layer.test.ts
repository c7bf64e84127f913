import { describe, expect, it } from 'vitest';
import type { Transform } from './reading.ts';
import { type TextLayer, chooseWords } from './text-layer.ts';
import { readWords } from './words.fixture.ts';

const asDrawn: Transform = [
  [1, 0, 0],
  [0, 1, 0],
];
const printed = [
  'The signal generator covers the range from',
  '0.5 to 32 megacycles in six bands, each with',
  'a calibrated attenuator and output meter.',
];
const read = readWords(
  printed.map((line) => line.replace('0.5', 'O.5').replace('bands', 'banus')),
  {
    'O.5': 60,
    banus: 70,
    'banus,': 70,
  },
);
const layerOf = (lines: readonly string[], shift = 0): TextLayer => ({
  words: readWords(lines).map(({ text, box: [x, y, w, h] }) => ({ text, box: [x + shift, y, w, h] })),
  isPainted: true,
});
const textOf = (words: readonly { text: string }[]): string => words.map(({ text }) => text).join(' ');
const choose = (layer: TextLayer | null, wish?: 'picture' | 'file', transform = asDrawn) =>
  chooseWords(read, layer, { transform, wish });

describe('the words that a file carries for a page', () => {
  it('are taken, with their boxes, where they are painted and agree with the picture', () => {
    const { words, wordsFrom, warnings } = choose(layerOf(printed));
    expect({ text: textOf(words), wordsFrom, warnings }).toEqual({
      text: printed.join(' '),
      wordsFrom: 'file',
      warnings: [],
    });
    expect(new Set(words.map(({ line }) => line)).size).toBe(3);
  });

  it('are not taken, with a warning, where the picture says something else', () => {
    const other = printed.map((line) => line.replace(/[a-z]{3,}/g, (word) => [...word].reverse().join('')));
    const { words, wordsFrom, warnings } = choose(layerOf(other));
    expect({ text: textOf(words), wordsFrom }).toEqual({ text: textOf(read), wordsFrom: 'picture' });
    expect(warnings).toMatchObject([{ kind: 'text-differs' }]);
  });

  it('are not taken unasked where they lie hidden behind a scan, and can be asked for', () => {
    const hidden = { ...layerOf(printed), isPainted: false };
    expect(choose(hidden).wordsFrom).toBe('picture');
    expect(textOf(choose(hidden, 'file').words)).toBe(printed.join(' '));
  });

  it('are left when the archivist wants the picture read', () => {
    expect(textOf(choose(layerOf(printed), 'picture').words)).toBe(textOf(read));
  });

  it('are found where the picture was moved in straightening', () => {
    const moved: Transform = [
      [1, 0, 500],
      [0, 1, 0],
    ];
    expect(textOf(choose(layerOf(printed, 500), undefined, moved).words)).toBe(printed.join(' '));
  });

  it('leave the lettering of pictures as it was read, and add lines that reading passed over', () => {
    const lettering = readWords(['', '', '', 'C12 L4']);
    const { words } = chooseWords(
      [...read, ...lettering.map((word) => ({ ...word, line: 3 }))],
      layerOf([...printed, '', '5-12']),
      {
        transform: asDrawn,
        wish: undefined,
      },
    );
    expect(textOf(words)).toBe(`${printed.join(' ')} C12 L4 5-12`);
  });
});
