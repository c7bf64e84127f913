import { dimensions, plainNumber, type Dimension } from '#shared/units/dimensions.ts';
import type { ExpressionScope } from './scope.ts';

/** Some quantities of a receiver and a table of one row, in base units. */
const names = ['carrier', 'first_if', 'channel', 'n', 'coil', 'capacitor', 'level'];
const kinds: Record<string, Dimension> = {
  carrier: dimensions.frequency,
  first_if: dimensions.frequency,
  channel: plainNumber,
  n: plainNumber,
  coil: dimensions.inductance,
  capacitor: dimensions.capacitance,
  level: dimensions['power level'],
};
export const slots = Float64Array.from([156.6e6, 10.7e6, 12, 9, 100e-6, 253.3e-12, -107]);
export const scope: ExpressionScope = {
  dimensionOf: (symbol) => kinds[symbol],
  slotOf: (symbol) => names.indexOf(symbol),
  findTable: (id) =>
    id === 'plan'
      ? {
          title: 'Plan',
          keyDimension: plainNumber,
          columns: new Map([
            ['ship', { dimension: dimensions.frequency, read: (key) => (key === 12 ? 156.6e6 : NaN) }],
          ]),
          explainMiss: (key) => `Channel ${key} is not in "Plan".`,
        }
      : undefined,
};
