import { describe, expect, it } from 'vitest';
import { asChange, fieldAt, readTyped, typedFrom, untyped } from './quantity-form-values.ts';

const carrier = {
  id: 'q1',
  symbol: 'carrier',
  label: 'Channel frequency',
  kind: 'derived' as const,
  unit: 'mc',
  expression: 'injection + firstIf',
  printed: { text: '156.600 mc' },
  pageId: 'p1',
  limits: { low: 156 },
  tolerance: { kind: 'ppm' as const, plus: 20, minus: 10 },
};

describe('a quantity in a form', () => {
  it('comes out as it went in', () => {
    const { id: _id, ...rest } = carrier;
    expect(readTyped(typedFrom(carrier))).toEqual({ ok: true, quantity: rest });
  });

  it('reads a home value as a number, or as text where it has its own unit', () => {
    const home = (typed: string) => {
      const read = readTyped({ ...untyped, symbol: 'firstIf', unit: 'mc', home: typed });
      return read.ok ? read.quantity.home : read.faults;
    };
    expect(home('10.7')).toBe(10.7);
    expect(home(' 455 kc ')).toBe('455 kc');
    expect(home('')).toBeUndefined();
  });

  it('drops what belongs to another kind', () => {
    const read = readTyped({ ...typedFrom(carrier), kind: 'input' });
    expect(read.ok && 'expression' in read.quantity).toBe(false);
  });

  it('says at which field something is wrong', () => {
    const read = readTyped({ ...untyped, kind: 'derived', symbol: '1x', low: 'much' });
    const fields = read.ok ? [] : read.faults.map(({ field }) => field);
    expect(fields).toContain('low');
    const next = readTyped({ ...untyped, kind: 'derived', symbol: '1x' });
    expect(next.ok ? [] : next.faults.map(({ field }) => field)).toEqual(
      expect.arrayContaining(['symbol', 'expression']),
    );
    expect(fieldAt('limits.high')).toBe('high');
  });

  it('takes away by name what is no longer there', () => {
    const read = readTyped({ ...untyped, symbol: 'channel', home: '12' });
    if (!read.ok) throw new Error('It should be read.');
    expect(asChange(read.quantity)).toMatchObject({
      symbol: 'channel',
      home: 12,
      expression: null,
      printed: null,
      limits: null,
    });
  });
});
