import { describe, expect, it } from 'vitest';
import { compile } from './program.ts';
import { proof } from './proof.ts';
import { likeliestCause } from './proof-cause.ts';

/** A receiver with its i-f below the channel: 156.6 - 10.7 = 145.9 mc, a ninth of that is 16.2111... mc. */
function causeOf(printed: string, expression = '(carrier - firstIf) / 9'): string | undefined {
  const program = compile([
    { symbol: 'carrier', label: '', kind: 'input', unit: 'mc', home: 156.6 },
    { symbol: 'firstIf', label: '', kind: 'constant', unit: 'mc', home: 10.7 },
    { symbol: 'crystal', label: '', kind: 'derived', unit: 'mc', expression, printed: { text: printed } },
  ]);
  const item = proof(program).items.find(({ symbol }) => symbol === 'crystal');
  return item === undefined ? undefined : likeliestCause(program, item)?.kind;
}

describe('the likeliest cause of a disagreement', () => {
  it.each([
    ['a digit misread', '16.271111 mc', 'digit'],
    ['digits swapped', '16.121111 mc', 'swapped'],
    ['a slip of the unit', '16.211111 kc', 'unit'],
    ['a point misplaced', '162.11111 mc', 'point'],
    ['a factor left out', '145.900000 mc', 'factor'],
  ])('is %s', (_what, printed, kind) => {
    expect(causeOf(printed)).toBe(kind);
  });

  it('is digits cut off, where the paper does not round', () => {
    expect(causeOf('16.266666 mc', '(carrier + 0.5 MHz - firstIf) / 9')).toBe('rounding');
  });

  it('is an i-f on the other side where the value differs by twice that', () => {
    expect(causeOf('167.3 mc', 'carrier - firstIf')).toBe('offset');
  });

  it('is not guessed at where nothing simple explains it, nor sought where the proof holds', () => {
    expect(causeOf('19.876543 mc')).toBeUndefined();
    expect(causeOf('16.211111 mc')).toBeUndefined();
  });
});
