import { describe, expect, it } from 'vitest';
import { betterReading, doubtfulCells, withCellsReplaced } from './doubtful-cells.ts';
import { readWords } from './words.fixture.ts';

const list = [
  'REF. DES.    PART NO.      DESCRIPTION              QTY',
  'C1           B5-5131A      Mica, 47 mmf             1',
  'C2           M3-5447A      Paper, .01 mfd           1',
  'C3           R2-1487C      Paper, .02 mfd',
  'C4           K3-6458B      Ceramic disc             1',
  'C5           H4-1854C      Ceramic, tubular         1',
];

describe('cells that are worth a second look', () => {
  it('hold a doubtful word, or are empty in a column that is full', () => {
    const cells = doubtfulCells(readWords(list, { tubular: 50 }));
    expect(cells.map(({ words }) => words.map(({ text }) => text).join(' '))).toEqual(['Ceramic, tubular', '']);
    expect(cells[1]?.zone).toEqual([1860, 550, 26, 32]);
  });

  it('are fewer among long descriptions, which take long to read', () => {
    const long = list.map((line) => line.replace('Ceramic, tubular  ', 'Tubular, 500 v d c'));
    const doubtful = (confidence: number): number => doubtfulCells(readWords(long, { 'Tubular,': confidence })).length;
    expect([doubtful(60), doubtful(40)]).toEqual([1, 2]);
  });

  it('are none on a page without tables', () => {
    expect(doubtfulCells(readWords(['Some text of no great length.'], { great: 20 }))).toEqual([]);
  });
});

describe('two readings of a cell', () => {
  const [doubtful, sure] = [readWords(['Cs'], { Cs: 40 }), readWords(['C8'], { C8: 90 })];

  it('leave the more confident one', () => {
    expect([betterReading(doubtful, sure), betterReading(sure, doubtful), betterReading(doubtful, [])]).toEqual([
      sure,
      sure,
      doubtful,
    ]);
  });

  it('never lose a sign to a surer reading without it, nor gain a stray mark', () => {
    const sign = readWords(['±20%'], { '±20%': 40 });
    const plain = readWords(['C202'], { C202: 40 });
    expect([betterReading(sign, readWords(['220%'])), betterReading(plain, readWords(['© C202']))]).toEqual([
      sign,
      plain,
    ]);
  });

  it('where the page showed nothing must be sure of what is there', () => {
    expect([betterReading([], doubtful), betterReading([], sure)]).toEqual([[], sure]);
  });

  it('keep the order and the lines of the page', () => {
    const words = readWords(['C1 Mica 1', 'Cs Paper']);
    const cs = words.slice(3, 4);
    const [one] = readWords(['', '              1']);
    const replaced = withCellsReplaced(words, [
      { cell: { zone: [0, 0, 1, 1], words: cs }, by: sure },
      { cell: { zone: [0, 0, 1, 1], words: [] }, by: one === undefined ? [] : [one] },
    ]);
    expect(replaced.map(({ text, line }) => `${text}:${line}`)).toEqual([
      'C1:0',
      'Mica:0',
      '1:0',
      'C8:1',
      'Paper:1',
      '1:1',
    ]);
  });
});
