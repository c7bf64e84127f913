/** Load capacitance of an oscillator with a capacitor at each side of the crystal: Ca Cb / (Ca + Cb) + Cs, in farads. */
export const loadOfTwoCapacitors = (first: number, second: number, stray: number): number =>
  (first * second) / (first + second) + stray;
/** The equal capacitors that make a load: 2 (CL - Cs), in farads. */
export const capacitorsForLoad = (load: number, stray: number): number => 2 * (load - stray);
/** Least transconductance to start: 4 ESR (2 pi f)^2 (C0 + CL)^2, in A/V. */
export const criticalTransconductance = ({
  esr,
  hz,
  c0,
  load,
}: {
  esr: number;
  hz: number;
  c0: number;
  load: number;
}): number => 4 * esr * (2 * Math.PI * hz) ** 2 * (c0 + load) ** 2;
