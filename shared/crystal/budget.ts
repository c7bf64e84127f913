/** One part of a crystal's error, in ppm either way. */
export type BudgetPart = { part: 'making' | 'temperature' | 'ageing' | 'pulling' | 'other'; ppm: number };
export type ErrorBudget = {
  /** All parts against it at once, and the root of the sum of squares, which holds for independent parts only. */
  worstPpm: number;
  rssPpm: number;
};
export type ErrorAtCarrier = { worstHz: number; rssHz: number; worstPpm: number; rssPpm: number };

export const errorBudget = (parts: readonly BudgetPart[]): ErrorBudget => ({
  worstPpm: parts.reduce((sum, { ppm }) => sum + Math.abs(ppm), 0),
  rssPpm: Math.sqrt(parts.reduce((sum, { ppm }) => sum + ppm ** 2, 0)),
});

/**
 * The budget carried to the carrier. Multiplying keeps ppm and multiplies hertz; a mixer passes hertz on: so the error in
 * ppm of the carrier is smaller than that of the crystal by injection over carrier.
 */
export function errorAtCarrier(
  budget: ErrorBudget,
  { crystalHz, factor, carrierHz }: { crystalHz: number; factor: number; carrierHz: number },
): ErrorAtCarrier {
  const injectionHz = crystalHz * factor;
  const [worstHz, rssHz] = [budget.worstPpm, budget.rssPpm].map((ppm) => ppmToHz(injectionHz, ppm)) as [number, number];
  return {
    worstHz,
    rssHz,
    worstPpm: deviationPpm(worstHz + carrierHz, carrierHz),
    rssPpm: deviationPpm(rssHz + carrierHz, carrierHz),
  };
}

export const ppmToHz = (hz: number, ppm: number): number => hz * ppm * 1e-6;
/** How far a measured frequency is from its nominal one, in ppm. */
export const deviationPpm = (hz: number, nominalHz: number): number => ((hz - nominalHz) / nominalHz) * 1e6;
