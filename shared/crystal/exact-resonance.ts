import type { CrystalModel } from './model.ts';

/**
 * The resonances of the lossy model, from its admittance Y = 1/(R1 + jX) + j w C0 with X = w L1 - 1/(w C1).
 * Everything runs over d = (f - fs)/fs: near resonance X is the small difference of two large reactances, and
 * X = d (2 + d) / (1 + d) / (ws C1) has no such difference in it.
 */
const turns = 120;

type Setting = { ws: number; x: (d: number) => number };

const settingOf = ({ l1, c1 }: CrystalModel): Setting => {
  const ws = 1 / Math.sqrt(l1 * c1);
  return { ws, x: (d) => (d * (2 + d)) / (1 + d) / (ws * c1) };
};

/** Series and parallel resonance where the crystal is purely resistive, in Hz; undefined where losses leave none. */
export function zeroPhaseResonances(crystal: CrystalModel): { series: number; parallel: number } | undefined {
  const { ws, x } = settingOf(crystal);
  const { r1, c0, c1 } = crystal;
  /** Positive where capacitive: w C0 (R1^2 + X^2) - X has the sign of the imaginary part of Y. */
  const susceptance = (d: number): number => ws * (1 + d) * c0 * (r1 ** 2 + x(d) ** 2) - x(d);
  const last = Math.sqrt(1 + c1 / c0) - 1;
  const middle = lowest(susceptance, 0, last);
  if (susceptance(middle) >= 0) return undefined;
  const series = halve(susceptance, middle, 0);
  const parallel = halve(susceptance, middle, last);
  const hz = ws / (2 * Math.PI);
  return { series: hz * (1 + series), parallel: hz * (1 + parallel) };
}

/** Where crystal and load capacitance in series are purely resistive, in Hz; undefined where losses leave no such point. */
export function exactLoadResonance(crystal: CrystalModel, load: number): number | undefined {
  const { ws, x } = settingOf(crystal);
  const { r1, c0, c1 } = crystal;
  /** Negative of the reactance of crystal and load together. */
  const lack = (d: number): number => {
    const w = ws * (1 + d);
    const size = r1 ** 2 + x(d) ** 2;
    const [conductance, susceptance] = [r1 / size, w * c0 - x(d) / size];
    return 1 / (w * load) + susceptance / (conductance ** 2 + susceptance ** 2);
  };
  const top = lowest(lack, 0, Math.sqrt(1 + c1 / c0) - 1);
  return lack(top) >= 0 ? undefined : (ws / (2 * Math.PI)) * (1 + halve(lack, top, 0));
}

/** The zero between a place where `f` is negative and one where it is not. */
function halve(f: (d: number) => number, negative: number, positive: number): number {
  let [below, above] = [negative, positive];
  for (let turn = 0; turn < turns; turn += 1) {
    const middle = (below + above) / 2;
    if (f(middle) < 0) below = middle;
    else above = middle;
  }
  return (below + above) / 2;
}

/** Where `f`, falling and then rising, is lowest: by thirds. */
function lowest(f: (d: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let turn = 0; turn < turns; turn += 1) {
    const third = (high - low) / 3;
    if (f(low + third) < f(high - third)) high -= third;
    else low += third;
  }
  return (low + high) / 2;
}
