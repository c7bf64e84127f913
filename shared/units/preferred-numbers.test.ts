import { describe, expect, it } from 'vitest';
import { readBandwidth, writeBandwidth } from './emission-bandwidth.ts';
import { bandwidthCases, noBandwidths, seriesCases } from './preferred-numbers.cases.ts';
import { nearestPreferred, preferredNumbers, preferredSeries } from './preferred-numbers.ts';

describe('preferred numbers', () => {
  it.each(preferredSeries)('%s is the published list', (series) => {
    expect(preferredNumbers(series)).toEqual(seriesCases[series]);
  });

  it.each([
    [4600, 'E12', 4700],
    [32.1, 'E3', 22],
    [32.2, 'E3', 47],
    [95, 'E24', 91],
    [97, 'E24', 100],
    [0.92, 'E192', 0.92],
  ] as const)('%d is nearest to %s %d', (value, series, expected) => {
    expect(nearestPreferred(value, series)).toBe(expected);
  });
});

describe('bandwidths of emissions', () => {
  it.each(bandwidthCases)('$hz Hz is $code', ({ hz, code }) => {
    expect(writeBandwidth(hz)).toBe(code);
    // 180.5 and 180.7 kHz are both written 181K: the code holds three figures.
    expect(Math.abs((readBandwidth(code) ?? NaN) / hz - 1)).toBeLessThan(0.005);
  });

  it.each(noBandwidths)('%s is no bandwidth', (code) => {
    expect(readBandwidth(code)).toBeUndefined();
  });
});
