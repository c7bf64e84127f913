import { describe, expect, it } from 'vitest';
import { evaluate } from './evaluate.ts';
import { compile } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';
import { derived, input } from './sample-quantities.fixture.ts';

describe('what is wrong with a program', () => {
  it('names a ring, each of its members, and what lies behind', () => {
    const ring = compile([
      derived('a1', 'c1 + 1'),
      derived('b1', 'a1'),
      derived('c1', 'b1'),
      derived('d1', 'c1'),
      input('e1'),
      derived('f1', 'e1'),
    ]);
    expect(ring.problems.map(({ symbol, code }) => [symbol, code])).toEqual([
      ['a1', 'cycle'],
      ['b1', 'cycle'],
      ['c1', 'cycle'],
    ]);
    expect(ring.problems[0]?.message).toContain('a1 needs c1 needs b1 needs a1');
    const { values } = evaluate(ring);
    expect(values['d1']).toMatchObject({ value: null, problem: { code: 'depends-on-unavailable', cause: 'c1' } });
    expect(values['f1']?.value).toBe(1);
    expect(ring.order).toEqual(['e1', 'f1']);
  });

  it('finds a quantity that needs itself, and two rings that share a member', () => {
    expect(compile([derived('a1', 'a1 + 1')]).problems).toMatchObject([{ code: 'cycle', symbol: 'a1' }]);
    const eight = compile([derived('a1', 'b1 + c1'), derived('b1', 'a1'), derived('c1', 'a1')]);
    expect(Object.values(evaluate(eight).values).map(({ value }) => value)).toEqual([null, null, null]);
  });

  it.each([
    ['an unknown symbol', [derived('a1', '2 * nowhere')], 'unknown-symbol', 'a1'],
    [
      'a sum of two kinds',
      [input('a1', { unit: 'MHz' }), derived('b1', 'a1 + 1', { unit: 'MHz' })],
      'unit-mismatch',
      'b1',
    ],
    [
      'a result of another kind',
      [input('a1', { unit: 'MHz' }), derived('b1', 'a1 * a1', { unit: 'MHz' })],
      'unit-mismatch',
      'b1',
    ],
    ['a syntax error', [derived('a1', '2 *')], 'bad-expression', 'a1'],
    ['an unknown table', [derived('a1', 'lookup("none", 1, "x")')], 'bad-expression', 'a1'],
    ['a symbol used twice', [input('a1'), input('a1', { home: 2 })], 'duplicate-symbol', 'a1'],
    ['a missing home', [{ symbol: 'a1', label: '', kind: 'input', unit: '' }], 'missing-home', 'a1'],
    ['a home of another kind', [input('a1', { unit: 'MHz', home: '3 v' })], 'unit-mismatch', 'a1'],
    ['an unknown unit', [input('a1', { unit: 'furlong' })], 'bad-unit', 'a1'],
    ['a unit as symbol', [input('mc')], 'bad-symbol', 'mc'],
  ] as [string, QuantityDefinition[], string, string][])('reports %s', (_, definitions, code, symbol) => {
    const faulty = compile([
      ...definitions,
      derived('behind', symbol === 'mc' ? 'nowhere' : symbol, { unit: definitions.at(-1)?.unit ?? '' }),
    ]);
    expect(faulty.problems[0]).toMatchObject({ code, symbol });
    const { values } = evaluate(faulty);
    expect(values[symbol]).toMatchObject({ value: null, text: '' });
    expect(values['behind']?.value).toBeNull();
  });

  it('computes an input without home as soon as it is set', () => {
    const late = compile([{ symbol: 'a1', label: '', kind: 'input', unit: '' }, derived('b1', 'a1 + 1')]);
    expect(evaluate(late, { a1: 3 }).values).toMatchObject({ a1: { value: 3 }, b1: { value: 4 } });
  });

  it.each([
    [0, 'division-by-zero'],
    [-1, 'root-of-negative'],
  ])('shows no number for 1 / sqrt(%d)', (a1, code) => {
    const { values } = evaluate(
      compile([input('a1'), derived('b1', '1 / sqrt(a1)'), derived('c1', 'a1 > 100 ? b1 : 5')]),
      { a1 },
    );
    expect(values['b1']).toMatchObject({ value: null, problem: { code } });
    // The other case would not need b1; behind a problem there is no number all the same.
    expect(values['c1']).toMatchObject({ value: null });
  });

  it('never lets an infinity through', () => {
    expect(evaluate(compile([input('a1'), derived('b1', '10 ^ a1')]), { a1: 400 }).values['b1']).toMatchObject({
      value: null,
      problem: { code: 'not-finite' },
    });
  });
});
