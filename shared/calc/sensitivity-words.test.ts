import { describe, expect, it } from 'vitest';
import { evaluate } from './evaluate.ts';
import { compile } from './program.ts';
import { derived, input } from './sample-quantities.fixture.ts';
import { sensitivityWords } from './sensitivity-words.ts';

describe('an error budget', () => {
  const carrier = { ...input('carrier', { home: 156.6, unit: 'MHz' }), label: 'Carrier' };
  const crystal = { ...derived('crystal', 'carrier / 9', { unit: 'MHz' }), label: 'Crystal' };
  const { values } = evaluate(compile([carrier, crystal]), {}, { sensitivities: true });

  it('is told in a sentence', () => {
    const sensitivity = values['crystal']?.sensitivity?.['carrier'];
    // Multiplication by M divides what the crystal has to move by M: chain arithmetic, from the definition.
    expect(sensitivity && sensitivityWords(carrier, crystal, sensitivity)).toBe(
      '1 kHz at the carrier is 111 Hz at the crystal',
    );
    expect(sensitivityWords(carrier, crystal, { absolute: 0, ppm: 0 })).toBeUndefined();
    expect(sensitivityWords(crystal, carrier, { absolute: -9, ppm: null })).toBe(
      '1 kHz at the crystal is \u22129 kHz at the carrier',
    );
  });

  // JCGM 100:2008, 5.1.2 (from memory): independent contributions 3 and 4 combine to 5.
  it('has the worst case and the root sum square, each judged by the limits', () => {
    const three = input('three', { home: 100, tolerance: { kind: 'absolute', plus: 3, minus: 3 } });
    const four = input('four', { home: 100, tolerance: { kind: 'percent', plus: 4, minus: 4 } });
    const sum = derived('sum', 'three + four', { limits: { low: 194, high: 206 } });
    const out = evaluate(compile([three, four, sum]), {}, { tolerances: true }).values['sum'];
    expect(out).toMatchObject({ low: 193, high: 207, rss: { low: 195, high: 205 } });
    expect(out?.verdict).toEqual({ allowed: { low: 194, high: 206 }, worstCase: 'fail', rss: 'pass' });
  });

  it('is judged by a printed tolerance where there are no limits', () => {
    const source = input('source', { unit: 'kHz', home: 10_700, tolerance: { kind: 'ppm', plus: 400, minus: 400 } });
    const verdictOf = (text: string) => {
      const printed = derived('shown', 'source', { unit: 'kHz', printed: { text } });
      return evaluate(compile([source, printed]), {}, { tolerances: true }).values['shown']?.verdict;
    };
    expect(verdictOf('10.7 mc \u00B1 5 kc')).toMatchObject({
      allowed: { low: 10_695, high: 10_705 },
      worstCase: 'pass',
    });
    expect(verdictOf('10.7 mc \u00B1 4 kc')).toMatchObject({ worstCase: 'fail', rss: 'fail' });
    expect(verdictOf('10.69 to 10.71 mc')).toMatchObject({ allowed: { low: 10_690, high: 10_710 }, rss: 'pass' });
    expect(verdictOf('10.7 mc')).toBeUndefined();
  });
});
