import { describe, expect, it } from 'vitest';
import { noPartValues, partCases, partSources } from './part-values.cases.ts';
import { readPartValue } from './read-part-value.ts';

describe('values of parts', () => {
  it.each(partCases)('"$text" on a $kind', ({ text, kind, expected, source }) => {
    expect(partSources[source]).not.toBe('');
    const read = readPartValue(text, kind);
    if (!read.ok) throw new Error(read.error.message);
    const { doubt: _doubt, ...value } = read.value;
    expect(value).toEqual({ ...expected, value: expect.closeTo(expected.value, 25) as number });
    expect(Math.abs(value.value / expected.value - 1)).toBeLessThan(1e-12);
  });

  it.each(noPartValues)('"$text" is no $kind', ({ text, kind }) => {
    expect(readPartValue(text, kind).ok).toBe(false);
  });

  it.each([
    ['100M', 'resistor'],
    ['470', 'capacitor'],
    ['1m0', 'capacitor'],
  ] as const)('"%s" on a %s may mean something else, and says so', (text, kind) => {
    expect(readPartValue(text, kind)).toMatchObject({ ok: true, value: { doubt: expect.any(String) as string } });
  });
});
