import { describe, expect, it } from 'vitest';
import { block, doc, paragraph, text } from './documents.fixture.ts';
import { pageNumbersOf, printedPageNumber } from './page-numbers.ts';

const page = (foot: string, head = 'HB-12 HARBOUR RECEIVER') =>
  doc(
    block('running', { place: 'head' }, text(head)),
    paragraph(text('12 turns')),
    ...(foot === '' ? [] : [block('running', { place: 'foot' }, text(foot))]),
  );

describe('the number that a page prints', () => {
  it.each([
    ['5-3', '5-3'],
    ['- 23 -', '23'],
    ['Page iv', 'iv'],
    ['TW 112-3 5-3', '5-3'],
    ['5-3 Change 2', '5-3'],
    ['Revised 1969-08', null],
    ['', null],
  ])('"%s" is %s', (foot, printed) => expect(printedPageNumber(page(foot))).toBe(printed));

  it('is looked for in the head where the foot has none', () => {
    expect(printedPageNumber(page('', 'SECTION 5 5-7'))).toBe('5-7');
  });
});

describe('the numbers of a manual', () => {
  const of = (...feet: string[]) =>
    pageNumbersOf(feet.map((foot, at) => ({ pageId: `p${at}`, label: String(at + 1), document: page(foot) }))).problems;

  it('have no problem while they rise, over sections and pages without a number', () =>
    expect(of('i', '1-1', '1-2', '', '5-1', '5-2')).toEqual([]));

  it('say where pages are missing, and where two print the same', () => {
    expect(of('1-1', '1-4', '1-4').map(({ says }) => says)).toEqual([
      'Between 1-1 and 1-4 2 pages are missing.',
      'Pages 2 and 3 both print 1-4.',
    ]);
    expect(of('7', '9').map(({ says }) => says)).toEqual(['Between 7 and 9 a page is missing.']);
  });
});
