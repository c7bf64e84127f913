import { describe, expect, it } from 'vitest';
import { checkPlan } from './check-plan.ts';
import { mixerProducts, phaseNoiseRiseDb } from './mixer-products.ts';
import { planOf, run, singleConversion } from './plans.fixture.ts';
import type { FrequencyPlan } from './plan.ts';

const mixing = (
  signal: string,
  injection: string,
  side: 'high' | 'low',
  product: 'sum' | 'difference' = 'difference',
) =>
  planOf(
    { id: 's', kind: 'input', frequency: signal },
    { id: 'lo', kind: 'crystal', frequency: injection },
    { id: 'mix', kind: 'mixer', from: ['s', 'lo'], product, injection: side },
  );
const scaled = (frequency: string, stage: Record<string, unknown>): FrequencyPlan =>
  planOf({ id: 's', kind: 'input', frequency }, { ...stage, id: 'x', kind: String(stage['kind']), from: ['s'] });
const mhz = (plan: FrequencyPlan, symbol: string): number => run(plan).values[symbol]?.value ?? NaN;

describe('published chains come out', () => {
  it.each([
    // NCVEC Element 4 pool 2016-2020, E4C14: 14.300 MHz, IF 455 kHz, oscillator above: image 15.210 MHz.
    ['E4C14 image', mixing('14.300 MHz', '14.755 MHz', 'high'), 'plan_mix__image', 15.21],
    // A public study guide for E4C14: the other image.
    ['E4C14 low side', mixing('14.300 MHz', '13.845 MHz', 'low'), 'plan_mix__image', 13.39],
    // NCVEC Element 3 pool 2019-2023, G8B02: 14.255 with 13.800 MHz gives 455 kHz, image 13.345 MHz.
    ['G8B02 IF', mixing('14.255 MHz', '13.800 MHz', 'low'), 'plan_mix', 0.455],
    ['G8B02 image', mixing('14.255 MHz', '13.800 MHz', 'low'), 'plan_mix__image', 13.345],
    // NCVEC Element 3 pool, G8B07: a 12.21 MHz oscillator, output 146.52 MHz.
    ['G8B07 factor', scaled('12.21 MHz', { kind: 'multiplier', factor: '12' }), 'plan_x', 146.52],
    // oldradios.co.za, "Superhet tracking - padder and trimmer": 1.422 MHz and 455 kHz need 1.877 MHz.
    ['superhet oscillator', mixing('1.422 MHz', '0.455 MHz', 'high', 'sum'), 'plan_mix', 1.877],
    // Analog Devices ADF4150HV data sheet Rev. 0, p. 20: 25 MHz, INT 120, FRAC 1, MOD 25, output divider 2.
    ['fractional N', scaled('25 MHz', { kind: 'loop', n: '120 + 1/25', r: '2' }), 'plan_x', 1500.5],
    ['fractional N, its modulus', scaled('25 MHz', { kind: 'divider', divisor: '25' }), 'plan_x', 1],
    // Public compilation of Unified S-Band parameters: 2106.40625 up, 2287.5 down, ratio 240/221.
    ['turnaround', scaled('2106.40625 MHz', { kind: 'synthesiser', n: '240', r: '221' }), 'plan_x', 2287.5],
    // CCSDS tracking data messages: 880/749, X up to X down; deep-space channel 14.
    ['X turnaround', scaled('7162.3125 MHz', { kind: 'synthesiser', n: '880', r: '749' }), 'plan_x', 8415],
    // Half-IF law, textbook; its check 2 (156.7) - 2 (151.35) = 10.7 stands below.
    ['half-IF', mixing('146 MHz', '156.7 MHz', 'high'), 'plan_mix__half_if', 151.35],
    // Dual modulus P 8, B 1466, A 5 of 12.5 kHz: N = P B + A, textbook.
    ['dual modulus', scaled('12.5 kHz', { kind: 'loop', n: '8 * 1466 + 5' }), 'plan_x', 146.6625],
    // 47 CFR 73.682(a), from memory: TV channel 2, visual carrier 55.25, IF 45.75 MHz.
    ['TV oscillator', mixing('55.25 MHz', '45.75 MHz', 'high', 'sum'), 'plan_mix', 101],
    // Common practice, no source: military guard is the second harmonic of 121.5 MHz.
    ['guard', scaled('121.5 MHz', { kind: 'multiplier', factor: '2' }), 'plan_x', 243],
    // Second-order sum, textbook.
    ['sum', mixing('7.0 MHz', '7.1 MHz', 'high', 'sum'), 'plan_mix', 14.1],
  ])('%s', (_, plan, symbol, expected) => {
    expect(mhz(plan, symbol)).toBe(expected);
  });

  it('Ulysses, X downlink from S uplink channel 9', () => {
    // Anderson et al. (2001): factor 880/221; the product is arithmetic.
    const plan = scaled('2111.607292 MHz', { kind: 'synthesiser', n: '880', r: '221' });
    expect(mhz(plan, 'plan_x')).toBeCloseTo(8408.210031493213, 9);
  });

  it.each([
    // Textbook law fX = (fRX - fIF) / M: 156.8 MHz, 10.7 MHz, 9.
    ['156.8 MHz', '10.7 MHz', '9', 16.233333333333334],
    // Customary receive crystal of CB channel 9: common practice, no source.
    ['27.065 MHz', '455 kHz', '1', 26.61],
  ])('the crystal of %s and an IF of %s', (carrier, ifText, factor, crystal) => {
    const wanted = run(singleConversion({ carrier, crystal: '', factor, injection: 'low' }), {
      pin: { symbol: 'plan_mixer1', value: ifText, solveFor: 'plan_y1' },
    });
    expect(wanted.pinned?.value).toBeCloseTo(crystal, 11);
    const back = run(singleConversion({ carrier: '', crystal: `${crystal} MHz`, factor, injection: 'low' }), {
      pin: { symbol: 'plan_mixer1', value: ifText, solveFor: 'plan_rf' },
    });
    expect(back.pinned?.value).toBeCloseTo(parseFloat(carrier), 9);
  });

  it('the count of a loop is solved for', () => {
    // 146.520 MHz in steps of 5 kHz: 29304, textbook law.
    const { pinned } = run(scaled('5 kHz', { kind: 'loop', n: '1' }), {
      pin: { symbol: 'plan_x', value: '146.520 MHz', solveFor: 'plan_x__n' },
    });
    expect(pinned).toMatchObject({ value: 29304, exact: true });
  });

  it('an offset loop runs above or below its mix', () => {
    const offset = (side: string) =>
      planOf(
        { id: 'ref', kind: 'crystal', frequency: '25 kHz' },
        { id: 'mix', kind: 'crystal', frequency: '100 MHz' },
        { id: 'vco', kind: 'loop', from: ['ref', 'mix'], n: '400', side },
      );
    expect(mhz(offset('above'), 'plan_vco')).toBe(110);
    expect(mhz(offset('below'), 'plan_vco')).toBe(90);
  });

  it('third-order intermodulation, both answers of E4D05', () => {
    // NCVEC Element 4 pool, E4D05: 146.52 and 146.34 or 146.61 MHz fall on 146.70 MHz.
    const product = (first: string, second: string) =>
      planOf(
        { id: 'f1', kind: 'input', frequency: first },
        { id: 'f2', kind: 'input', frequency: second },
        { id: 'twice', kind: 'multiplier', from: ['f1'], factor: '2' },
        { id: 'im3', kind: 'mixer', from: ['twice', 'f2'], product: 'difference', injection: 'low' },
      );
    const pin = { symbol: 'plan_im3', value: '146.70 MHz' };
    expect(run(product('146.52 MHz', ''), { pin: { ...pin, solveFor: 'plan_f2' } }).pinned?.value).toBe(146.34);
    expect(run(product('', '146.52 MHz'), { pin: { ...pin, solveFor: 'plan_f1' } }).pinned?.value).toBe(146.61);
    expect(mhz(product('146.61 MHz', '146.52 MHz'), 'plan_im3')).toBe(146.7);
  });

  it('an error of a crystal reaches the injection multiplied', () => {
    // 5 ppm on 8.1 MHz x 18 is 729 Hz: textbook law; E4B03 to E4B05 of the NCVEC Element 4 pool: ppm of 146.52 MHz.
    const spread = (frequency: string, tolerance: string, factor: string): number => {
      const plan = planOf(
        { id: 'y', kind: 'crystal', frequency, tolerance },
        { id: 'x', kind: 'multiplier', from: ['y'], factor },
      );
      const live = run(plan, { tolerances: true }).values['plan_x'];
      return ((live?.high ?? NaN) - (live?.value ?? NaN)) * 1e6;
    };
    expect(spread('8.1 MHz', '5 ppm', '18')).toBeCloseTo(729, 5);
    expect(spread('146.52 MHz', '1.0 ppm', '1')).toBeCloseTo(146.52, 5);
    expect(spread('146.52 MHz', '0.1 ppm', '1')).toBeCloseTo(14.652, 5);
    expect(spread('146.52 MHz', '10 ppm', '1')).toBeCloseTo(1465.2, 5);
  });

  it('a deviation is multiplied with the frequency', () => {
    // NCVEC Element 3 pool, G8B07: 5 kHz at 146.52 MHz is 416.7 Hz at 12.21 MHz; the rise of x 18 is 25.1 dB, textbook law.
    const plan = planOf(
      { id: 'y', kind: 'crystal', frequency: '12.21 MHz' },
      { id: 'x', kind: 'multiplier', from: ['y'], factor: '12' },
      { id: 'out', kind: 'output', from: ['x'] },
    );
    const found = checkPlan(plan, run(plan).values).find(({ code }) => code === 'deviation');
    expect(5000 / (found?.count ?? NaN)).toBeCloseTo(416.7, 1);
    expect(phaseNoiseRiseDb(18)).toBeCloseTo(25.1, 1);
  });
});

describe('mixer products', () => {
  it('of 156.7 and 146 MHz, to the third harmonic of each', () => {
    // Arithmetic, |m 156.7 + n 146| in MHz.
    const table = [
      [0, 1, 146], [0, 2, 292], [0, 3, 438],
      [1, -3, 281.3], [1, -2, 135.3], [1, -1, 10.7], [1, 0, 156.7], [1, 1, 302.7], [1, 2, 448.7], [1, 3, 594.7],
      [2, -3, 124.6], [2, -2, 21.4], [2, -1, 167.4], [2, 0, 313.4], [2, 1, 459.4], [2, 2, 605.4], [2, 3, 751.4],
      [3, -3, 32.1], [3, -2, 178.1], [3, -1, 324.1], [3, 0, 470.1], [3, 1, 616.1], [3, 2, 762.1], [3, 3, 908.1],
    ] as const; // prettier-ignore
    const products = mixerProducts(156_700_000, 146_000_000, 6);
    for (const [m, n, expected] of table)
      expect(products.find((each) => each.m === m && each.n === n)?.hz).toBe(Math.round(expected * 1e6));
    expect(new Set(products.map(({ m, n }) => `${m} ${n}`)).size).toBe(products.length);
  });

  it('the half-IF response is 2 injection - 2 signal', () => {
    // Textbook: 2 (156.7) - 2 (151.35) = 10.7 MHz.
    expect(mixerProducts(156_700_000, 151_350_000, 4).find(({ m, n }) => m === 2 && n === -2)?.hz).toBe(10_700_000);
  });
});
