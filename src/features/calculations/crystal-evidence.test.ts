import { describe, expect, it } from 'vitest';
import { evidenceFrom, nothingTyped } from './crystal-evidence.ts';

describe('what is typed about a crystal', () => {
  it('is read with its unit, or in megahertz and picofarads', () => {
    const { evidence, faults } = evidenceFrom({
      ...nothingTyped,
      marked: '16.211111',
      series: '16211.0 kc',
      testCapacitor: '30',
      testFrequency: '16.2121 mc',
      markedOvertone: '3',
    });
    expect(faults).toEqual({});
    expect(evidence).toMatchObject({ markedHz: 16_211_111, seriesHz: 16_211_000, markedOvertone: 3 });
    expect(evidence.load?.farads).toBeCloseTo(30e-12, 20);
  });

  it('tells a response that was not found from one that was not looked for', () => {
    expect(evidenceFrom({ ...nothingTyped, nearThird: 'none' }).evidence.nearThirdHz).toBeNull();
    expect(evidenceFrom(nothingTyped).evidence).toEqual({});
  });

  it('says what is no frequency and no capacitance', () => {
    const { faults } = evidenceFrom({ ...nothingTyped, marked: '30 pf', testCapacitor: 'some' });
    expect(Object.keys(faults)).toEqual(['marked', 'testCapacitor']);
  });
});
