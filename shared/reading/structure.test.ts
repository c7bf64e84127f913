import { describe, expect, it } from 'vitest';
import { textOf } from '#shared/document/text-of.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { tablesOf } from '#shared/document/tables.ts';
import type { Reading, ReadingWord } from './reading.ts';
import { repairWords } from './repair.ts';
import { documentOf } from './structure.ts';
import { readingOf } from './words.fixture.ts';
import { columnMeaning, tableKind } from './type-columns.ts';

const letterWidth = 30;
const pitch = 50;

/** Lines of typewriting as recognition would give them: `[left, top, text]`, three spaces or more part the cells. */
function wordsOf(lines: readonly [number, number, string][]): ReadingWord[] {
  return lines.flatMap(([left, top, line], at) =>
    [...line.matchAll(/\S+/g)].map((match) => ({
      text: match[0],
      raw: match[0],
      confidence: 95,
      box: [left + match.index * letterWidth, top, match[0].length * letterWidth - 4, 32] as ReadingWord['box'],
      line: at,
      block: 0,
    })),
  );
}

const page = (...lines: string[]): [number, number, string][] => lines.map((line, at) => [300, 400 + at * pitch, line]);

const reading = (words: ReadingWord[], figures: Reading['figures'] = []): Reading => readingOf(words, { figures });

const documentOfLines = (...lines: [number, number, string][]) => documentOf(reading(wordsOf(lines)));
const kindsOf = (document: ReturnType<typeof documentOf>): string[] => document.content.map(({ type }) => type);

describe('the structure of a page', () => {
  it('has headings, steps with their markers and depth, and what a warning says in the warning', () => {
    const document = documentOfLines(
      ...page(
        '5.2 INJECTION CHAIN',
        '',
        'WARNING',
        '',
        'The plate supply is 250 volts.',
        '',
        'a. Connect the meter',
        'to test point TP3.',
        '(1) Adjust C20.',
        'c, Move the meter to TP2.',
      ),
    );
    expect(kindsOf(document)).toEqual(['heading', 'admonition', 'step', 'step', 'step']);
    expect(document.content[1]).toMatchObject({ attrs: { kind: 'warning' }, content: [{ type: 'paragraph' }] });
    expect(document.content.slice(2).map(({ attrs }) => [attrs?.['marker'], attrs?.['depth']])).toEqual([
      ['a.', 0],
      ['(1)', 1],
      ['c.', 0],
    ]);
    expect(textOf(document)).toContain('a. Connect the meter to test point TP3.');
  });

  it('joins a word that the printer broke at the end of a line', () => {
    expect(textOf(documentOfLines(...page('The align-', 'ment begins at the r-f', 'stage.')))).toBe(
      'The alignment begins at the r-f stage.',
    );
  });

  it('sets running heads and feet apart', () => {
    const document = documentOfLines([900, 120, 'HB-12 RECEIVER'], ...page('Text of the page.'), [1200, 3150, '5-1']);
    expect(document.content.map(({ type, attrs }) => [type, attrs?.['place']])).toEqual([
      ['running', 'head'],
      ['paragraph', undefined],
      ['running', 'foot'],
    ]);
  });

  it('starts a new paragraph after a gap', () => {
    expect(
      kindsOf(
        documentOfLines([300, 400, 'One thing is this.'], [300, 450, 'It goes on.'], [300, 580, 'Another thing.']),
      ),
    ).toEqual(['paragraph', 'paragraph']);
  });

  it('starts a new paragraph behind a step, where a line begins further out than the text of the step', () => {
    const document = documentOfLines(
      ...page(
        '   1. Connect the meter and',
        '      read it.',
        '  The heater is rated',
        '6.3 volts.',
        '   2. Turn it off.',
      ),
    );
    expect(kindsOf(document)).toEqual(['step', 'paragraph', 'step']);
  });

  it('ends a caption in capitals where small letters begin', () => {
    const document = documentOfLines(...page('TABLE 4-7. CHANNEL FREQUENCIES', 'The crystal is found by subtracting.'));
    expect(kindsOf(document)).toEqual(['caption', 'paragraph']);
  });

  it('puts a figure where it stands, keeps its lettering with it, and its caption below', () => {
    const words = wordsOf([
      [300, 400, 'Before the figure.'],
      [600, 700, 'MIXER'],
      [300, 1300, 'Figure 4-1. Chain of frequencies'],
    ]);
    const document = documentOf(reading(words, [[400, 500, 1500, 700]]));
    expect(kindsOf(document)).toEqual(['paragraph', 'figure', 'caption']);
    expect(document.content[1]?.attrs).toMatchObject({ description: 'MIXER', zone: [400, 500, 1500, 700] });
  });

  it('is a document that can be stored, with a zone and a name for every block', () => {
    const document = documentOfLines(...page('NOTE', '', 'Mind the core.', '', '1. Turn it.'));
    expect(readDocument(document)).toEqual({ ok: true, value: document });
    expect(
      document.content.every(({ attrs }) => typeof attrs?.['id'] === 'string' && Array.isArray(attrs['zone'])),
    ).toBe(true);
  });

  it('of a blank page is one empty paragraph', () => {
    expect(kindsOf(documentOf(reading([])))).toEqual(['paragraph']);
  });

  it('marks words that recognition was unsure of, and numbers that cannot be', () => {
    const words = wordsOf(page('Set it to 7.51.2 mc at once')).map((each, at) =>
      at === 0 ? { ...each, confidence: 40 } : each,
    );
    const marks = JSON.stringify(documentOf(reading(words)));
    expect(marks.match(/low-confidence/g)).toHaveLength(1);
  });
});

describe('a table on a page', () => {
  const list = page(
    'REF. DES.    DESCRIPTION            PART NO.    QTY',
    '             CAPACITORS',
    'C1           Mica, 47 mmf           22-1470     1',
    'C2, C3       Paper, .01 mfd,        24-4103     2',
    '             400 v dcw',
    'C4           Ceramic disc           21-3102     1',
    'C5           Variable, air          23-1015     1',
  );

  it('is found by its words alone, with empty cells left empty and wrapped descriptions joined', () => {
    const [table] = tablesOf(documentOfLines(...list));
    expect(table?.kind).toBe('parts');
    expect(table?.columns.map(({ meaning }) => meaning)).toEqual(['refDes', 'description', 'partNumber', 'quantity']);
    expect(table?.rows).toEqual([
      ['C1', 'Mica, 47 mmf', '22-1470', '1'],
      ['C2, C3', 'Paper, .01 mfd, 400 v dcw', '24-4103', '2'],
      ['C4', 'Ceramic disc', '21-3102', '1'],
      ['C5', 'Variable, air', '23-1015', '1'],
    ]);
  });

  it('has its section headings as rows of their own kind', () => {
    const table = documentOfLines(...list).content.find(({ type }) => type === 'table');
    expect(table?.content?.map(({ attrs }) => attrs?.['role'])).toEqual([
      'head',
      'section',
      'body',
      'body',
      'body',
      'body',
    ]);
  });

  it('is not seen in running text', () => {
    const lines = Array.from(
      { length: 12 },
      (_, at) => `Line ${at} of ordinary text that fills the width of the page and goes on`,
    );
    expect(kindsOf(documentOfLines(...page(...lines)))).not.toContain('table');
  });

  it.each([
    ['REF. DES.', ['C1'], 'refDes'],
    ['CRYSTAL MC', ['16.211111'], 'frequency'],
    ['QTY', ['1'], 'quantity'],
    ['', ['C1', 'R12', 'C3, C4'], 'refDes'],
    ['', ['22-1470', '41-5470'], 'partNumber'],
    ['', ['Mica, 500 v', 'Paper tubular'], 'description'],
  ] as const)('knows what the column "%s" with %j means: %s', (heading, cells, meaning) => {
    expect(columnMeaning(heading, cells)).toBe(meaning);
  });

  it('with channels and frequencies is a channel table', () => {
    expect(tableKind(['channel', 'frequency', 'frequency'])).toBe('channel');
    expect(tableKind(['other', 'other'])).toBe('table');
  });
});

describe('repair by the grammar of units', () => {
  const repaired = (line: string): string =>
    repairWords(wordsOf([[0, 0, line]]))
      .map(({ text }) => text)
      .join(' ');

  it.each([
    ['tuned to 455 ke exactly', 'tuned to 455 kc exactly'],
    ['good to +.002 percent', 'good to ±.002 percent'],
    ['*20% 400 v', '±20% 400 v'],
    ['the key is +5 volts', 'the key is +5 volts'],
    ['give me the meter', 'give me the meter'],
  ])('makes "%s" into "%s"', (read, printed) => {
    expect(repaired(read)).toBe(printed);
  });

  it('keeps what was recognised beside what it was made into', () => {
    expect(repairWords(wordsOf([[0, 0, '455 ke']]))[1]).toMatchObject({ text: 'kc', raw: 'ke' });
  });
});
