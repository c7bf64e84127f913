import { describe, expect, it } from 'vitest';
import { unitDefinitions } from '#shared/units/definitions.ts';
import { mendUnit } from './bent-units.ts';
import { mendDesignator } from './designators.ts';
import { repairWords } from './repair.ts';
import { readWords } from './words.fixture.ts';

const repaired = (line: string): string =>
  repairWords(readWords([line]))
    .map(({ text }) => text)
    .join(' ');

describe('a unit behind a number', () => {
  it.each([
    ['455 ke', '455 kc'],
    ['(7.2 me)', '(7.2 mc)'],
    ['33 ph,', '33 µh,'],
    ['12 pv', '12 µv'],
    ['2.5 psec', '2.5 µsec'],
    ['470 ppf', '470 µµf'],
    ['100 puf,', '100 µµf,'],
    ['.01 pf', '.01 µf'],
    ['470 Q,', '470 Ω,'],
    ['600 v dew', '600 v dcw'],
    ['600 vdew', '600 v dcw'],
    ['CRYSTAL (me)', 'CRYSTAL (mc)'],
    ['25 Vv', '25 v'],
  ])('read as "%s" was printed "%s"', (read, printed) => {
    expect(repaired(read)).toBe(printed);
  });

  it.each(['give me the meter', 'step 4 see figure 2', 'a 6AQ5 and a 2N404', '22 pf', '2 uf', 'Q 5'])(
    'is not put where none was: "%s" stays',
    (line) => {
      expect(repaired(line)).toBe(line);
    },
  );

  it('read as pf or uf was µf on a page that prints µ elsewhere, as a guess', () => {
    const words = repairWords(readWords(['22 pf and 2 uf across 33 ph']));
    expect(words.map(({ text }) => text).join(' ')).toBe('22 µf and 2 µf across 33 µh');
    expect(words.map(({ sure }) => sure)).toEqual([
      undefined,
      false,
      undefined,
      undefined,
      false,
      undefined,
      undefined,
      true,
    ]);
  });

  it.each(unitDefinitions.filter(({ symbol }) => symbol !== ''))(
    'as the table has it is left alone: $symbol',
    (unit) => {
      for (const spelling of [unit.symbol, ...(unit.exact ?? []), ...(unit.anyCase ?? [])])
        expect(mendUnit(spelling)).toBeNull();
    },
  );
});

describe('the sign ±', () => {
  it.each([
    ['*20% 400 v', '±20% 400 v'],
    ['good to +.002 percent', 'good to ±.002 percent'],
    ['shift +9 kc', 'shift ±9 kc'],
    ['the key is +5 volts', 'the key is +5 volts'],
    ['+80% -20%', '+80% -20%'],
    ['47 mmf 5%', '47 mmf 5%'],
  ])('"%s" becomes "%s"', (read, printed) => {
    expect(repaired(read)).toBe(printed);
  });

  it('is put back where it was lost or read as a 2, if the page prints it elsewhere', () => {
    expect(repaired('1 w +5% 2 w +10% 1 w *5% 47 mmf 5%, 33 mmf 210%, rise of 25%')).toBe(
      '1 w ±5% 2 w ±10% 1 w ±5% 47 mmf ±5%, 33 mmf ±10%, rise of 25%',
    );
  });
});

describe('other slips', () => {
  it.each([
    ['set to 7:5 mc', 'set to 7.5 mc'],
    ['a ratio of 3:1', 'a ratio of 3:1'],
    ['of ,005 mfd', 'of .005 mfd'],
    ['SECTION Ill', 'SECTION III'],
    ['2 v 3 v 4 v 5 v 6 v 8.2K and V1A', '2 v 3 v 4 v 5 v 6 v 8.2 K and V1A'],
    ['a 5v supply', 'a 5v supply'],
    ['grid of Vv1141.', 'grid of V1141.'],
    ["'TRANSFORMER, power", 'TRANSFORMER, power'],
    ['set "LOCAL" on', 'set "LOCAL" on'],
  ])('"%s" becomes "%s"', (read, printed) => {
    expect(repaired(read)).toBe(printed);
  });

  it('in a designator are mended in running text only where a capital was read small', () => {
    expect(mendDesignator('c526.')).toEqual({ text: 'C526.', sure: false });
    expect([mendDesignator('v6'), mendDesignator('no12'), mendDesignator('C526')]).toEqual([null, null, null]);
  });

  it('keep what was recognised beside what it was made into', () => {
    expect(repairWords(readWords(['455 ke']))[1]).toMatchObject({ text: 'kc', raw: 'ke', sure: true });
  });
});
