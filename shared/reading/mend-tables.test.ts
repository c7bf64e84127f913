import { describe, expect, it } from 'vitest';
import { countOf } from './counts.ts';
import { designatorsLike } from './designators.ts';
import { findTables } from './find-tables.ts';
import { mendTables } from './mend-tables.ts';
import { commonShapes, mendPunctuation, mendShape } from './shapes.ts';
import { typedTable } from './typed-table.ts';
import { readWords } from './words.fixture.ts';

function bodyOf(lines: readonly string[], confidences: Record<string, number> = {}): string[][] {
  const [found] = findTables(mendTables(readWords(lines, confidences)));
  if (found === undefined) return [];
  return typedTable(found).body.map(({ cells }) =>
    cells.map((cell) =>
      cell
        .map(({ text }) => text)
        .filter((text) => text !== '')
        .join(' '),
    ),
  );
}

const partsList = [
  'REF. DES.    PART NO.      DESCRIPTION              QTY',
  'C1           B5-5131A      Mica, 47 mmf             1',
  'c2           M3-5447A      Paper, .01 mfd           1',
  'C3,c7        R2-14B7C      Paper, .02 mfd           2',
  'cs           K3-6458B      Ceramic disc             i',
  'C9           H4-1854C      Ceramic disc             1',
  'C10-C12      A7-50558      Variable, air            a',
  '01           C1-7829C      Transistor, silicon      1',
  'Q2           R7-0254B      Transistor, silicon      1',
  'RI           J9-8312A      Film, 100 ohms           1',
];

describe('a parts list', () => {
  it('has its designators, part numbers and counts mended by what their columns hold', () => {
    const rows = bodyOf(partsList, { a: 30, i: 40, cs: 50 });
    expect(rows.map(([designator]) => designator)).toEqual([
      'C1',
      'C2',
      'C3,C7',
      'C8',
      'C9',
      'C10-C12',
      'Q1',
      'Q2',
      'R1',
    ]);
    expect(rows.map((row) => row[1])).toContain('A7-5055B');
    expect(rows.map((row) => row[1])).toContain('R2-1487C');
    expect(rows.map((row) => row[3])).toEqual(['1', '1', '2', '1', '1', '3', '1', '1', '1']);
  });

  it('keeps a heading in the column of descriptions as a row of its own, and joins a wrapped description', () => {
    const lines = [
      ...partsList.slice(0, 4),
      '                           RESISTORS',
      ...partsList.slice(9),
      '                           wound on a long ceramic',
    ];
    const [found] = findTables(readWords(lines));
    expect(found?.rows.map(({ cells }) => (cells[2] ?? []).map(({ text }) => text).join(' '))).toEqual([
      'DESCRIPTION',
      'Mica, 47 mmf',
      'Paper, .01 mfd',
      'Paper, .02 mfd',
      'RESISTORS',
      'Film, 100 ohms wound on a long ceramic',
    ]);
  });
});

describe('a channel table', () => {
  const channels = Array.from(
    { length: 10 },
    (_, at) =>
      `${at + 1}`.padEnd(12) +
      `${(157.1 + at * 0.05).toFixed(3)}`.padEnd(14) +
      `${(12_100 + at * 4.2).toFixed(1).replace('12', '12,')}`,
  );

  it('has doubtful figures that break an even row made into those that fit, and lost points put back', () => {
    const bent = [
      'CHANNEL     FREQ. (mc)    HALF (kc)',
      ...channels.map((line) => line.replace(/^5 /, 'S ').replace('157.350', '157.250').replace('12,108.4', '12,1084')),
    ];
    const rows = bodyOf(bent, { S: 40, '157.250': 60, '12,1084': 50 });
    expect(rows.map(([channel]) => channel)).toEqual(['1', '2', '3', '4', '5', '6', '7', '8', '9', '10']);
    expect(rows[5]?.[1]).toBe('157.350');
    expect(rows[2]?.[2]).toBe('12,108.4');
  });

  it('keeps a figure that was read with confidence, whatever its neighbours say', () => {
    const bent = ['CHANNEL     FREQ. (mc)    HALF (kc)', ...channels.map((line) => line.replace('157.350', '157.250'))];
    expect(bodyOf(bent)[5]?.[1]).toBe('157.250');
  });
});

describe('shapes', () => {
  const shapes = commonShapes(['B5-5131A', 'M3-5447A', 'R2-1487C', 'K3-6458', 'H4-1854', 'A7-5055']);

  it.each([
    ['A7-50558', 'A7-5055B'],
    ["'M1-1921C", 'M1-1921C'],
    ['HO0-0276B', 'H0-0276B'],
    ['€2-2395', 'C2-2395'],
    ['K1:1358C', 'K1-1358C'],
  ])('make "%s" into "%s"', (read, printed) => {
    expect(mendShape(read, shapes)?.text).toBe(printed);
  });

  it.each(['B5-5131A', 'SEE NOTE', '44'])('leave "%s" as it is', (text) => {
    expect(mendShape(text, shapes)).toBeNull();
  });

  it('put points and commas back only where the figures are as many', () => {
    const figures = new Set(['99,999.9']);
    expect([mendPunctuation('12.2275', figures)?.text, mendPunctuation('1227', figures)]).toEqual(['12,227.5', null]);
  });
});

describe('designators', () => {
  it.each([
    ['CRI101', 'CR1101'],
    ['$1101', 'S1101'],
    ['€103', 'C103'],
    ['Cc11', 'C11'],
    ['0101', 'Q101'],
    ['Vi', 'V1'],
  ])('are seen in "%s": %s', (read, printed) => {
    expect(designatorsLike(read)[0]).toBe(printed);
  });

  it.each([
    ['C1', 1],
    ['C1, C4', 2],
    ['R1-R4,R9', 5],
    ['Same', null],
    ['R4-R1', null],
  ])('"%s" are %s parts', (text, count) => {
    expect(countOf(text)).toBe(count);
  });
});
