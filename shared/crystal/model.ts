/**
 * The Butterworth-Van Dyke model of a quartz crystal unit: L1, C1 and R1 in series, C0 across them.
 * All values in SI units: henry, farad, ohm, hertz. C0 includes holder and stray capacitance at the pins.
 * Laws: standard network algebra; load resonance, resistance at load and drive as in the check values of the tests.
 */
export type CrystalModel = { l1: number; c1: number; c0: number; r1: number };

const twoPi = 2 * Math.PI;

/** 1 / (2 pi sqrt(L1 C1)). */
export const seriesResonance = ({ l1, c1 }: Pick<CrystalModel, 'l1' | 'c1'>): number =>
  1 / (twoPi * Math.sqrt(l1 * c1));
/** fs sqrt(1 + C1/C0), losses left out. */
export const parallelResonance = (crystal: Pick<CrystalModel, 'l1' | 'c1' | 'c0'>): number =>
  seriesResonance(crystal) * Math.sqrt(1 + crystal.c1 / crystal.c0);

/** What a load capacitance needs of a crystal; `fs` in Hz. */
export type PulledCrystal = { fs: number; c1: number; c0: number };

/** fs sqrt(1 + C1/(C0 + CL)), losses left out. Series operation is a load of Infinity, never of 0. */
export const loadResonance = ({ fs, c1, c0 }: PulledCrystal, load: number): number =>
  fs * Math.sqrt(1 + c1 / (c0 + load));
/** fs (1 + C1 / (2 (C0 + CL))): too high by some hundredths of a ppm in ordinary units. */
export const loadResonanceApproximately = ({ fs, c1, c0 }: PulledCrystal, load: number): number =>
  fs * (1 + c1 / (2 * (c0 + load)));
/** How far the load resonance lies above series resonance, in ppm: C1 / (2 (C0 + CL)), first order. */
export const loadOffsetPpm = ({ c1, c0 }: Omit<PulledCrystal, 'fs'>, load: number): number =>
  (1e6 * c1) / (2 * (c0 + load));
/** From one load to another, in ppm, first order: C1/2 (1/(C0+CLb) - 1/(C0+CLa)). More load, lower frequency. */
export const pullingPpm = (crystal: Omit<PulledCrystal, 'fs'>, from: number, to: number): number =>
  loadOffsetPpm(crystal, to) - loadOffsetPpm(crystal, from);
/** Slope of frequency over load in ppm per picofarad: -C1 / (2 (C0+CL)^2). */
export const trimSensitivity = ({ c1, c0 }: Omit<PulledCrystal, 'fs'>, load: number): number =>
  ((-1e6 * c1) / (2 * (c0 + load) ** 2)) * 1e-12;
/** Exact pulling between two loads: the frequencies and their distance in ppm of the first. */
export function pullingRange(
  crystal: PulledCrystal,
  from: number,
  to: number,
): { from: number; to: number; ppm: number } {
  const [first, second] = [loadResonance(crystal, from), loadResonance(crystal, to)];
  return { from: first, to: second, ppm: (second / first - 1) * 1e6 };
}

/** 2 pi fs L1 / R1. */
export const qualityFactor = ({ l1, r1 }: Pick<CrystalModel, 'l1' | 'r1'>, hz: number): number =>
  (twoPi * hz * l1) / r1;
/** R1 (1 + C0/CL)^2, in ohms. */
export const resistanceAtLoad = ({ r1, c0 }: Pick<CrystalModel, 'r1' | 'c0'>, load: number): number =>
  r1 * (1 + c0 / load) ** 2;
/** I^2 R, in watts; the rms current is the one through the unit. */
export const driveOfCurrent = (amperes: number, ohms: number): number => amperes ** 2 * ohms;
/** V^2 R1 (2 pi f (C0+CL))^2, in watts; the rms voltage is the one across the unit, losses small. */
export const driveOfVoltage = (
  { r1, c0 }: Pick<CrystalModel, 'r1' | 'c0'>,
  { volts, hz, load }: { volts: number; hz: number; load: number },
): number => volts ** 2 * r1 * (twoPi * hz * (c0 + load)) ** 2;
/** -1 / (2 pi f C), in ohms. */
export const capacitorReactance = (hz: number, farads: number): number => -1 / (twoPi * hz * farads);

/** Static over motional capacitance of an ideal plate: pi^2 n^2 / (8 k^2); k = 8.8 % for AT (formula from memory). */
export const idealCapacitanceRatio = (overtone: number, coupling = 0.088): number =>
  (Math.PI * overtone) ** 2 / (8 * coupling ** 2);
