import { describe, expect, it } from 'vitest';
import { checkPlan } from './check-plan.ts';
import { harbourQuantities, harbourReceiver, planOf, run } from './plans.fixture.ts';

const check = (plan: ReturnType<typeof planOf>) =>
  checkPlan(plan, run(plan, { quantities: harbourQuantities, tolerances: true }).values);

describe('checking the harbour receiver', () => {
  const findings = check(harbourReceiver);
  const of = (stage: string, code: string) => findings.find((each) => each.stage === stage && each.code === code);

  it('finds the images where the manual has them, and what keeps them out', () => {
    // HB-12, paragraph 4.3: 135.200 and 9.790 mc (invented manual; arithmetic).
    expect(of('mixer1', 'image')).toMatchObject({ weight: 'good' });
    expect(of('mixer1', 'image')?.hz).toBeCloseTo(135_199_998, -1);
    expect(of('mixer2', 'image')?.message).toMatch(
      /^Mixer "V6": the image is at 9\.789999 MHz; filter "T1, T2" keeps it out/,
    );
  });

  it('finds the half-IF response and who keeps it out', () => {
    expect(of('mixer1', 'half-if')).toMatchObject({ weight: 'good' });
    expect(of('mixer1', 'half-if')?.hz).toBeCloseTo(151_250_000, -2);
  });

  it('has every filter inside its pass band and the sidebands upright', () => {
    expect(findings.filter(({ code }) => code === 'inside-limits').map(({ stage }) => stage)).toEqual([
      'preselector',
      'if1',
      'if2',
    ]);
    expect(of('out', 'sidebands')).toMatchObject({ count: 0 });
    expect(findings.filter(({ weight }) => weight === 'alarm')).toEqual([]);
  });
});

describe('what checking finds', () => {
  const rf = { id: 'rf', kind: 'input', name: 'Antenna', frequency: '156.6 MHz' };
  const lo = (frequency: string) => ({ id: 'lo', kind: 'crystal', name: 'Y1', frequency });
  const mix = (from: string[], injection = 'low') => ({
    id: 'mix',
    kind: 'mixer',
    name: 'V2',
    from,
    product: 'difference',
    injection,
  });
  const say = (...stages: Parameters<typeof planOf>) => check(planOf(...stages)).map(({ message }) => message);

  it('a stage outside its pass band or tuning range', () => {
    expect(
      say(rf, { id: 'f', kind: 'filter', name: 'L1', from: ['rf'], limits: { low: '150 MHz', high: '155 MHz' } }),
    ).toEqual([
      'Filter "L1": 156.6 MHz is outside its pass band, 150 MHz to 155 MHz. Retune it, or change what feeds it.',
    ]);
    const vcxo = {
      id: 'v',
      kind: 'vcxo',
      name: 'Y3',
      frequency: '16.3 MHz',
      limits: { low: '16.1 MHz', high: '16.2 MHz' },
    };
    expect(say(vcxo)[0]).toContain('outside its tuning range');
  });

  it('a tolerance that leaves the band', () => {
    const y = {
      id: 'y',
      kind: 'crystal',
      frequency: '10 MHz',
      tolerance: '20 ppm',
      limits: { low: '9.9999 MHz', high: '10.0001 MHz' },
    };
    expect(say(y)[0]).toMatch(/with all tolerances against it, 10 MHz becomes (9\.9998|10\.0002) MHz/);
  });

  it('an injection on the wrong side', () => {
    expect(say(rf, lo('167.3 MHz'), mix(['rf', 'lo']))).toContain(
      'Mixer "V2": the injection is set to low, but at 167.3 MHz it lies above the signal at 156.6 MHz. Set it to high, or change one of the two frequencies.',
    );
  });

  it('an image that the filter lets in, and one that nothing keeps out', () => {
    const wide = { id: 'f', kind: 'filter', name: 'L1', from: ['rf'], limits: { low: '130 MHz', high: '160 MHz' } };
    expect(say(rf, wide, lo('145.9 MHz'), mix(['f', 'lo']))).toContain(
      'Mixer "V2": the image is at 135.2 MHz, and filter "L1" lets it in (130 MHz to 160 MHz). Narrow it, or move the injection.',
    );
    expect(say(rf, lo('145.9 MHz'), mix(['rf', 'lo'])).join()).toContain(
      'no filter with a pass band stands before the mixer',
    );
  });

  it('products that fall into the IF', () => {
    // 4 x 26.75 = 107 = 10 x 10.7; 2 signal - 3 injection: 2 (21.4) - 3 (10.7) = 10.7.
    const after = {
      id: 'if1',
      kind: 'filter',
      name: 'T1',
      from: ['mix'],
      limits: { low: '10.6 MHz', high: '10.8 MHz' },
    };
    const all = check(planOf({ ...rf, frequency: '21.4 MHz' }, lo('10.7 MHz'), mix(['rf', 'lo']), after));
    const products = all.filter(({ code }) => code === 'product-in-if');
    expect(products.map(({ message }) => message)).toContainEqual(
      expect.stringContaining('3 injection - 2 signal (order 5) falls at 10.7 MHz') as string,
    );
    expect(products[0]).toMatchObject({ weight: 'alarm' });
  });

  it('a harmonic of a crystal on the signal', () => {
    const found = check(planOf(rf, lo('145.9 MHz'), { id: 'y9', kind: 'crystal', name: 'Y9', frequency: '15.66 MHz' }));
    expect(found.map(({ message }) => message)).toEqual([
      'Crystal "Y9": its harmonic 10 falls at 156.6 MHz, on input "Antenna" (156.6 MHz). Screen it, or move the crystal or the IF.',
    ]);
  });

  it('no harmonic that the first filter lets in and the IF does not', () => {
    const wide = { id: 'f', kind: 'filter', name: 'L1', from: ['rf'], limits: { low: '155 MHz', high: '163 MHz' } };
    const narrow = (id: string, high: string) => ({
      id,
      kind: 'filter',
      from: ['mix'],
      limits: { low: '10.6 MHz', high },
    });
    const y9 = { id: 'y9', kind: 'crystal', frequency: '16.2 MHz' };
    const heard = (high: string) =>
      check(planOf(rf, wide, lo('145.9 MHz'), mix(['f', 'lo']), narrow('if1', high), y9)).filter(
        ({ code, stage }) => code === 'crystal-harmonic' && stage === 'y9',
      );
    // 10 x 16.2 = 162 MHz: 5.4 MHz from the signal.
    expect(heard('10.8 MHz')).toEqual([]);
    expect(heard('22 MHz').map(({ hz }) => hz)).toContain(162_000_000);
  });

  it('how often the sidebands turn', () => {
    const chain = (second: string) =>
      planOf(
        rf,
        lo('167.3 MHz'),
        mix(['rf', 'lo'], 'high'),
        { id: 'lo2', kind: 'crystal', frequency: second },
        { ...mix(['mix', 'lo2'], second === '11.155 MHz' ? 'high' : 'low'), id: 'mix2' },
        { id: 'out', kind: 'output', name: 'Out', from: ['mix2'] },
      );
    const count = (second: string) => check(chain(second)).find(({ code }) => code === 'sidebands')?.count;
    // High-side injection inverts; two of them restore (textbook).
    expect([count('11.155 MHz'), count('10.245 MHz')]).toEqual([2, 1]);
  });

  it('a division by zero, where it happens and with its remedy', () => {
    const found = check(planOf(rf, { id: 'd', kind: 'divider', name: 'Prescaler', from: ['rf'], divisor: '0' }));
    expect(found).toMatchObject([{ stage: 'd', code: 'no-value', weight: 'alarm' }]);
    expect(found[0]?.message).toMatch(
      /^Divider "Prescaler": the divisor of divider "Prescaler" is zero.*Give a divisor/,
    );
  });
});
