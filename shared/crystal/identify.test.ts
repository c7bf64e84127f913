import { describe, expect, it } from 'vitest';
import { identifyCrystal } from './identify.ts';
import { loadResonance, parallelResonance } from './model.ts';
import { motionalInductance } from './motional.ts';

/** An invented HB-12 channel crystal: 16.211111 mc at 32 pF, C1 20 fF, C0 5 pF. */
const marked = 16_211_111;
const fundamental = { c1: 20e-15, c0: 5e-12 };
const seriesHz = marked / Math.sqrt(1 + fundamental.c1 / (fundamental.c0 + 32e-12));
const unit = { fs: seriesHz, ...fundamental, l1: motionalInductance(seriesHz, fundamental.c1) };
const parallelHz = parallelResonance(unit);

describe('finding out what a crystal is', () => {
  it('a fundamental for 32 pF, from four measurements', () => {
    const found = identifyCrystal({
      markedHz: marked,
      seriesHz,
      parallelHz,
      nearThirdHz: null,
      nearFifthHz: null,
      load: { farads: 22e-12, hz: loadResonance(unit, 22e-12) },
    });
    expect(found).toMatchObject({ overtone: 1, operation: 'load' });
    expect(found.load?.likely).toBeCloseTo(32e-12, 14);
    expect(found.motional?.c1).toBeCloseTo(20e-15, 18);
    expect(found.reasons.join(' ')).toContain('the usual value there is 32 pF');
    expect(found.open).toEqual([]);
  });

  it('the same without a test capacitor: bounds, and what would settle them', () => {
    const found = identifyCrystal({ markedHz: marked, seriesHz, parallelHz });
    expect(found.overtone).toBe(1);
    expect(found.load?.low).toBeLessThan(32e-12);
    expect(found.load?.high).toBeGreaterThan(32e-12);
    expect(found.open.join(' ')).toContain('A measurement with a test capacitor in series settles it');
  });

  it('a third overtone in series resonance', () => {
    // 48.633333 mc; the fundamental lies 0.05 % off the exact third (its size from memory).
    const third = 48_633_333;
    const found = identifyCrystal({
      markedHz: third,
      seriesHz: third * (1 + 4e-6),
      parallelHz: third * (1 + 250e-6),
      nearThirdHz: (third / 3) * 1.0005,
    });
    expect(found).toMatchObject({ overtone: 3, operation: 'series' });
    expect(found.reasons[0]).toMatch(/answers at 16\.2192 MHz, near 48\.6333 MHz \/ 3: that is its fundamental/);
    expect(found.reasons[1]).toContain('as of a third overtone');
    expect(found.open).toEqual([]);
  });

  it('a fifth overtone', () => {
    const found = identifyCrystal({ markedHz: 100e6, seriesHz: 100e6, nearThirdHz: null, nearFifthHz: 20.01e6 });
    expect(found.overtone).toBe(5);
  });

  it('says what is open instead of guessing', () => {
    const bare = identifyCrystal({ markedHz: 25e6 });
    expect(bare.overtone).toBeUndefined();
    expect(bare.operation).toBeUndefined();
    expect(bare.open.join(' ')).toMatch(
      /mode is not known.*may be a fundamental or a third overtone.*Measure series resonance/,
    );
    const half = identifyCrystal({ markedHz: 25e6, nearThirdHz: null });
    expect(half.open.join(' ')).toContain('look near a fifth as well');
  });

  it('tells of a contradiction with the marking', () => {
    const found = identifyCrystal({ markedHz: 48e6, markedOvertone: 1, seriesHz: 48e6, nearThirdHz: 16.003e6 });
    expect(found.open).toContain('It is marked fundamental, but the measurements say third overtone.');
    const high = identifyCrystal({ markedHz: 10e6, seriesHz: 10.001e6 });
    expect(high.open.join(' ')).toContain('no load capacitor can bring it down');
  });

  it('believes a test capacitor that gives the marking', () => {
    const found = identifyCrystal({ markedHz: marked, seriesHz, load: { farads: 32e-12, hz: marked + 30 } });
    expect(found).toMatchObject({ operation: 'load', load: { likely: 32e-12 } });
  });
});
