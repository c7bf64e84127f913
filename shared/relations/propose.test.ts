import { describe, expect, it } from 'vitest';
import { asSymbol, judge } from './judge.fixture.ts';
import { madeUpManual } from './made-up-manuals.fixture.ts';
import { readPrintedNumber, type PrintedNumber } from './printed-number.ts';
import { proposeRelations } from './propose.ts';

const verdicts = Array.from({ length: 20 }, (_, at) => {
  const manual = madeUpManual(at + 1);
  const numbers = manual.numbers.map((each) => ({ ...each, symbol: asSymbol(each.id) }));
  return { ...judge(manual, proposeRelations(numbers)), numbers: numbers.length };
});
const sum = (of: 'first' | 'right' | 'truths' | 'found'): number =>
  verdicts.reduce((total, each) => total + each[of], 0);

describe('relations of twenty made-up manuals', () => {
  it('has 10 to 60 numbers and some relations in each', () => {
    for (const { numbers, truths } of verdicts)
      expect([numbers >= 10, numbers <= 60, truths > 0]).toEqual([true, true, true]);
  });

  it('nine of ten of the first five proposals are true', () => {
    expect(sum('first')).toBeGreaterThan(60);
    expect(sum('right') / sum('first')).toBeGreaterThanOrEqual(0.9);
  });

  it('four of five of the true relations are found', () => {
    expect(sum('truths')).toBeGreaterThan(100);
    expect(sum('found') / sum('truths')).toBeGreaterThanOrEqual(0.8);
  });
});

const read = (texts: readonly string[], more: (at: number) => Partial<PrintedNumber> = () => ({})): PrintedNumber[] =>
  texts.flatMap((text, at) => readPrintedNumber(text, { id: `n${at}`, page: '1', ...more(at) }) ?? []);

describe('a proposal', () => {
  it('gives the formula, the numbers filled in, and a sentence with their labels', () => {
    const labels = ['Crystal', undefined, 'First IF', undefined];
    const numbers = read(['16.211111 mc', '156.600 mc', '10.700 mc', '9'], (at) =>
      labels[at] === undefined ? {} : { label: labels[at] },
    );
    expect(proposeRelations(numbers)[0]).toMatchObject({
      target: 'n0',
      expression: '(n1 - n2) / 9',
      filled: '16.211111 mc = (156.600 mc - 10.700 mc) / 9',
      numbers: ['n0', 'n1', 'n2', 'n3'],
      says: 'Crystal (16.211111 mc) is (156.600 mc - First IF (10.700 mc)) / 9, to the digits printed.',
    });
  });

  it('takes one number printed twice, or once rounded, for one', () => {
    const proposals = proposeRelations(read(['16.211111 mc', '145.900 mc', '16.2111 mc', '145.9 mc']));
    expect(proposals.map(({ filled }) => filled)).toEqual(['16.211111 mc = 145.900 mc / 9']);
  });

  it('is not made of round numbers alone', () => {
    expect(
      proposeRelations(read(['100 kc', '200 kc', '300 kc', '500 kc', '5 mc', '10 mc', '1000 cps', '2000 cps'])),
    ).toEqual([]);
  });

  it('is not made of numbers that have nothing to do with each other', () => {
    expect(proposeRelations(read(['47.113 mc', '91.827 mc', '3.579 mc', '250 v', '6.3 v', '470 ohms', '12']))).toEqual(
      [],
    );
    expect(proposeRelations([])).toEqual([]);
  });
});

describe('columns of a table', () => {
  const carriers = [156.3, 156.4, 156.45, 156.5, 156.6, 156.65];
  const cells = (column: string, texts: string[]): PrintedNumber[] =>
    read(texts, (row) => ({ id: `${column}${row}`, column: { table: 'Table 2', name: column, row } }));
  const crystals = carriers.map((each) => `${((each - 10.7) / 9).toFixed(6)} mc`);

  it('are formulas of each other, with a constant that stands in the text', () => {
    const proposals = proposeRelations([
      ...read(['10.7 mc'], () => ({ symbol: 'firstIf' })),
      ...cells(
        'SHIP',
        carriers.map((each) => `${each.toFixed(3)} mc`),
      ),
      ...cells('CRYSTAL', crystals),
    ]);
    expect(proposals).toMatchObject([
      { target: 'column_crystal', expression: '(column_ship - firstIf) / 9', table: { holds: 6, rows: 6 } },
    ]);
  });

  it('may have a misprint, which is pointed out', () => {
    const misprinted = crystals.with(3, '16.202222 mc');
    const [first] = proposeRelations([
      ...cells(
        'SHIP',
        carriers.map((each) => `${each.toFixed(3)} mc`),
      ),
      ...cells('CRYSTAL', misprinted),
    ]);
    expect(first).toMatchObject({
      expression: '(column_ship - 10.7 MHz) / 9',
      table: { holds: 5, rows: 6, failing: [3] },
      says: 'Down the table, CRYSTAL is (SHIP - 10.7 MHz) / 9 in 5 of 6 rows.',
    });
  });

  it('may be the sum of two others', () => {
    const [a, b] = [
      ['3.112 mc', '3.457 mc', '3.981 mc', '4.023 mc', '4.6 mc'],
      ['1.203 mc', '1.777 mc', '1.001 mc', '1.36 mc', '1.9 mc'],
    ];
    const sums = a.map((each, at) => `${(parseFloat(each) + parseFloat(b[at] ?? '')).toFixed(3)} mc`);
    const proposals = proposeRelations([...cells('A', a), ...cells('B', b), ...cells('SUM', sums)]);
    expect(proposals.map(({ expression, target }) => `${target} = ${expression}`)).toEqual([
      'column_sum = column_a + column_b',
    ]);
  });
});
