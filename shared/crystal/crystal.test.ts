import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crystalDoubts } from './blank.ts';
import { errorAtCarrier, errorBudget } from './budget.ts';
import { exactLoadResonance, zeroPhaseResonances } from './exact-resonance.ts';
import { loadResonance, parallelResonance, pullingRange, seriesResonance } from './model.ts';
import { motionalFromParallel, motionalFromTwoLoads, motionalInductance } from './motional.ts';

const crystalOf = (r1: number) => ({ l1: motionalInductance(10e6, 14e-15), c1: 14e-15, c0: 5e-12, r1 });

describe('resonances from the admittance', () => {
  it('become the lossless ones where there is no resistance', () => {
    const crystal = crystalOf(0);
    const exact = zeroPhaseResonances(crystal);
    expect(exact?.series).toBeCloseTo(seriesResonance(crystal), 4);
    expect(exact?.parallel).toBeCloseTo(parallelResonance(crystal), 4);
    expect(exactLoadResonance(crystal, 20e-12)).toBeCloseTo(
      loadResonance({ fs: 10e6, c1: 14e-15, c0: 5e-12 }, 20e-12),
      4,
    );
  });

  it('move towards each other with resistance, as the admittance itself says', () => {
    const crystal = crystalOf(200);
    const exact = zeroPhaseResonances(crystal);
    expect(exact?.series).toBeGreaterThan(seriesResonance(crystal));
    expect(exact?.parallel).toBeLessThan(parallelResonance(crystal));
    // Phase of the admittance at the resonances, straight from its definition: zero.
    for (const hz of [exact?.series ?? NaN, exact?.parallel ?? NaN]) {
      const w = 2 * Math.PI * hz;
      const x = w * crystal.l1 - 1 / (w * crystal.c1);
      const size = crystal.r1 ** 2 + x ** 2;
      expect(Math.abs((w * crystal.c0 - x / size) / (crystal.r1 / size))).toBeLessThan(1e-3);
    }
  });

  it('are absent where losses are too large', () => {
    // 2 w C0 R1 > 1: the crystal is never inductive (algebra); here R1 = 1 / (2 w C0) is 1.6 kilohms.
    expect(zeroPhaseResonances(crystalOf(1700))).toBeUndefined();
    expect(exactLoadResonance(crystalOf(1700), 20e-12)).toBeUndefined();
    expect(zeroPhaseResonances(crystalOf(1500))).toBeDefined();
  });
});

describe('motional values', () => {
  it('come back from what a crystal would measure', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-15, max: 40e-15, noNaN: true }),
        fc.double({ min: 2e-12, max: 8e-12, noNaN: true }),
        (c1, c0) => {
          const crystal = { fs: 10e6, c1, c0, l1: motionalInductance(10e6, c1) };
          const load = (farads: number) => ({ farads, hz: loadResonance(crystal, farads) });
          const parallel = motionalFromParallel({
            series: 10e6,
            parallel: parallelResonance(crystal),
            load: load(30e-12),
          });
          const loads = motionalFromTwoLoads(10e6, load(15e-12), load(47e-12));
          for (const found of [parallel, loads]) {
            expect(found.ok && Math.abs(found.value.c1 / c1 - 1)).toBeLessThan(1e-5);
            expect(found.ok && Math.abs(found.value.c0 / c0 - 1)).toBeLessThan(1e-5);
          }
        },
      ),
    );
  });

  it('say what is wrong with a measurement', () => {
    const load = { farads: 30e-12, hz: 9_999_000 };
    expect(motionalFromParallel({ series: 10e6, parallel: 10.02e6, load })).toMatchObject({
      ok: false,
      error: { code: 'not-above-series' },
    });
    expect(motionalFromParallel({ series: 10e6, parallel: 10.001e6, load: { ...load, hz: 10.002e6 } })).toMatchObject({
      error: { code: 'not-below-parallel' },
    });
    const same = { farads: 30e-12, hz: 10.002e6 };
    expect(motionalFromTwoLoads(10e6, same, same)).toMatchObject({ error: { code: 'loads-alike' } });
  });
});

describe('what follows for a set', () => {
  it('a trimmer from 10 to 40 pF pulls by the difference of two load resonances', () => {
    const range = pullingRange({ fs: 10e6, c1: 14e-15, c0: 5e-12 }, 10e-12, 40e-12);
    // First order: 7 fF (1/45 pF - 1/15 pF) = -311 ppm.
    expect(range.ppm).toBeCloseTo(-311, 0);
  });

  it('a budget reaches the carrier smaller than the crystal has it', () => {
    // HB-12: 16.211111 mc x 9 = 145.9 mc injection, carrier 156.6 mc, 20 ppm: 2.918 kc (arithmetic).
    const budget = errorBudget([
      { part: 'making', ppm: 10 },
      { part: 'temperature', ppm: 10 },
    ]);
    const at = errorAtCarrier(budget, { crystalHz: 145.9e6 / 9, factor: 9, carrierHz: 156.6e6 });
    expect(at.worstHz).toBeCloseTo(2918, 6);
    expect(at.worstPpm).toBeCloseTo(18.6335, 4);
    expect(at.rssHz).toBeCloseTo(2918 / Math.SQRT2, 6);
  });

  it('what cannot well be is said', () => {
    // 1660 Hz m over 24 MHz: 69 micrometres (arithmetic; the coefficient from memory).
    expect(crystalDoubts({ hz: 24e6, overtone: 1 })).toEqual([
      'Marked 24.000 MHz as a fundamental, but the blank would be 69 µm thick. At this frequency the third overtone is usual too; check the mode.',
    ]);
    expect(crystalDoubts({ hz: 48e6, overtone: 1 })[0]).toContain('the blank would be 35 µm thick');
    expect(crystalDoubts({ hz: 16.2e6, overtone: 1 })).toEqual([]);
    expect(crystalDoubts({ hz: 25e6 })[0]).toContain('may be a fundamental or a third overtone');
    expect(crystalDoubts({ hz: 10e6, overtone: 2 })[0]).toContain('odd overtones only');
    // A Q&A post took 3.7 pF for 3.7 fF.
    expect(crystalDoubts({ hz: 32768, overtone: 1, c1: 3.7e-12 })[0]).toContain('pF may stand for fF');
  });
});
