import type { QuantityDefinition } from './quantity.ts';

/** Short ways to write a quantity in a test. */
export const input = (symbol: string, more: Partial<QuantityDefinition> = {}): QuantityDefinition => ({
  symbol,
  label: symbol,
  kind: 'input',
  unit: '',
  home: 1,
  ...more,
});

export const derived = (
  symbol: string,
  expression: string,
  more: Partial<QuantityDefinition> = {},
): QuantityDefinition => ({ symbol, label: symbol, kind: 'derived', unit: '', expression, ...more });
