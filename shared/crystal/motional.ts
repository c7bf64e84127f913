import { fail, succeed, type Result } from '#shared/kit/result.ts';

/** What was measured. Frequencies in Hz; the load is a capacitance in farads and the frequency with it in series. */
export type Resonances = { series: number; parallel: number; load: { farads: number; hz: number } };
export type Motional = { c1: number; c0: number; l1: number };
type Fault = { code: 'not-above-series' | 'not-below-parallel' | 'loads-alike'; message: string };

/** C1 over C0 + CL, from how far a resonance lies above fs: (f/fs)^2 - 1. */
const ratioAt = (hz: number, series: number): number => (hz / series) ** 2 - 1;
/** 1 / ((2 pi fs)^2 C1), in henry. */
export const motionalInductance = (series: number, c1: number): number => 1 / ((2 * Math.PI * series) ** 2 * c1);
/** C1 / ((fp/fs)^2 - 1), in farads. */
export const staticCapacitance = (c1: number, { series, parallel }: Pick<Resonances, 'series' | 'parallel'>): number =>
  c1 / ratioAt(parallel, series);

/** All values from series, parallel and one load resonance: C1/C0 and C1/(C0+CL) are known, CL sets the scale. */
export function motionalFromParallel({ series, parallel, load }: Resonances): Result<Motional, Fault> {
  const [whole, loaded] = [ratioAt(parallel, series), ratioAt(load.hz, series)];
  if (!(loaded > 0)) return fail(notAbove);
  if (!(loaded < whole))
    return fail({
      code: 'not-below-parallel',
      message: 'With a capacitor in series the frequency must lie below parallel resonance. Check which is which.',
    });
  const c0 = (loaded * load.farads) / (whole - loaded);
  return succeed(withInductance(series, whole * c0, c0));
}

/** All values from series resonance and two load resonances. */
export function motionalFromTwoLoads(
  series: number,
  first: Resonances['load'],
  second: Resonances['load'],
): Result<Motional, Fault> {
  const [a, b] = [ratioAt(first.hz, series), ratioAt(second.hz, series)];
  if (!(a > 0 && b > 0)) return fail(notAbove);
  const c0 = (b * second.farads - a * first.farads) / (a - b);
  if (!(c0 > 0 && Number.isFinite(c0)))
    return fail({
      code: 'loads-alike',
      message: 'The two loads do not tell C0 apart. Take two capacitors further apart, and let the crystal settle.',
    });
  return succeed(withInductance(series, a * (c0 + first.farads), c0));
}

const withInductance = (series: number, c1: number, c0: number): Motional => ({
  c1,
  c0,
  l1: motionalInductance(series, c1),
});
const notAbove: Fault = {
  code: 'not-above-series',
  message: 'With a capacitor in series the frequency must lie above series resonance. Measure both again.',
};
