import type { DemoQuantity, LivePlace } from './types.ts';

export const printed = (text: string, pageLabel: string, where: string): DemoQuantity['printed'] => ({
  text,
  pageLabel,
  where,
});

export const derived = (
  [symbol, unit, expression]: readonly [symbol: string, unit: string, expression: string],
  label: string,
  print: DemoQuantity['printed'],
): DemoQuantity => ({ symbol, label, kind: 'derived', unit, expression, printed: print });

/** Live places of one page, each as symbol, printed text and, where needed, the words before it. */
export const livePlacesOn = (
  pageLabel: string,
  places: readonly (readonly [symbol: string, text: string, context?: string])[],
): LivePlace[] =>
  places.map(([symbol, text, context]) => ({
    pageLabel,
    symbol,
    text,
    ...(context === undefined ? {} : { context }),
  }));
