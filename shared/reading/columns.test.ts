import { describe, expect, it } from 'vitest';
import { mendBullets } from './bullets.ts';
import { inReadingOrder } from './columns.ts';
import { linesOf, lineText } from './lines.ts';
import { readWords } from './words.fixture.ts';

const linesIn = (words: Parameters<typeof linesOf>[0]): string[] => linesOf(words).map(lineText);

const across = [
  'A line of text that runs from the one margin to the other of the page.',
  'the left column begins here and       then the right column follows on',
  'goes on for some lines of print       with as many lines of its own as',
  'until it comes to its own end at      the left one, and it ends in the',
  'the foot of the left column, and      words that close the whole page.',
  'And a last line that runs across both of them and stands below it all.',
];

describe('the reading order of a page', () => {
  it('takes the whole left column before the right one where the engine read straight across', () => {
    expect(linesIn(inReadingOrder(readWords(across), []))).toEqual([
      'A line of text that runs from the one margin to the other of the page.',
      'the left column begins here and',
      'goes on for some lines of print',
      'until it comes to its own end at',
      'the foot of the left column, and',
      'then the right column follows on',
      'with as many lines of its own as',
      'the left one, and it ends in the',
      'words that close the whole page.',
      'And a last line that runs across both of them and stands below it all.',
    ]);
  });

  it('is not upset by a speck between the columns that reads as a sign', () => {
    const specked = across.map((line, at) => (at === 3 ? line.replace('at      the', 'at  ~~  the') : line));
    expect(linesIn(inReadingOrder(readWords(specked), []))[5]).toMatch(/then the right column/);
  });

  it('leaves plain lines and tables as they were read', () => {
    const plain = across.filter((_, at) => at === 0 || at === 5);
    const table = [
      'C1   100 mmf   500 v   1',
      'C2   220 mmf   500 v   2',
      'C3   470 mmf   300 v   1',
      'C4   1 mfd   50 v   1',
    ];
    expect(linesIn(inReadingOrder(readWords([...plain, ...table]), []))).toEqual(
      linesIn(readWords([...plain, ...table])),
    );
  });
});

describe('bullets', () => {
  it('are put back where signs stand one below the other in front of lines', () => {
    const mended = mendBullets(readWords(['® One thing', '* and another', '¢ and a third', 'a plain line']));
    expect(linesIn(mended)).toEqual(['• One thing', '• and another', '• and a third', 'a plain line']);
    expect(mended[0]).toMatchObject({ raw: '®', sure: true });
  });

  it('stay what they are where there are only two', () => {
    expect(linesIn(mendBullets(readWords(['* One thing', '* and another', 'plain'])))[0]).toBe('* One thing');
  });
});
