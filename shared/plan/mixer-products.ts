/** What comes out of a mixer: |m injection + n signal|, of order |m| + |n|. */
export type MixerProduct = { m: number; n: number; order: number; hz: number };

/**
 * All products up to an order, each pair once: m from 0, and n from 1 where m is 0 (its mirror is the same frequency).
 * Law: product frequencies of a nonlinear element driven at two frequencies, textbook.
 */
export function mixerProducts(injectionHz: number, signalHz: number, highestOrder: number): MixerProduct[] {
  const products: MixerProduct[] = [];
  for (let m = 0; m <= highestOrder; m += 1) {
    const reach = highestOrder - m;
    for (let n = m === 0 ? 1 : -reach; n <= reach; n += 1) {
      if (m + Math.abs(n) === 0) continue;
      products.push({ m, n, order: m + Math.abs(n), hz: Math.abs(m * injectionHz + n * signalHz) });
    }
  }
  return products;
}

/** `2 injection - 3 signal`. */
export function nameProduct({ m, n }: MixerProduct): string {
  const term = (times: number, word: string): string => (times === 1 ? word : `${times} ${word}`);
  if (n === 0) return term(m, 'injection');
  if (m === 0) return term(Math.abs(n), 'signal');
  return `${term(m, 'injection')} ${n < 0 ? '-' : '+'} ${term(Math.abs(n), 'signal')}`;
}

/** By how many dB a multiplication raises phase noise: 20 log10 of the factor (textbook law). */
export const phaseNoiseRiseDb = (factor: number): number => 20 * Math.log10(Math.abs(factor));
