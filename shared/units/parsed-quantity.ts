import type { QuantityTolerance } from './parse-tolerance.ts';
import type { NumberText, PrintedPower } from './quantity-text.ts';

export type QuantityProblem = {
  code: 'not-a-quantity' | 'unknown-unit' | 'ambiguous-unit' | 'not-understood';
  message: string;
};

/** A quantity as it stands on paper: `magnitude` in `unit` (a symbol of the table), with what is needed to print another like it. */
export type ParsedQuantity = {
  magnitude: number;
  decimalText: string;
  unit: string;
  /** Printed digits after the point. */
  decimals: number;
  tolerance?: QuantityTolerance;
  /** Both ends in `unit`; the magnitude is then their middle. */
  range?: { low: number; high: number };
  printed: string;
  layout: QuantityLayout;
};
/** Where the number stands in `printed`, and how it is written there. */
export type QuantityLayout = {
  start: number;
  end: number;
  notation: 'decimal' | 'letter' | 'range';
  grouped: boolean;
  bareDecimalPoint: boolean;
  power?: PrintedPower;
};

/** The quantity without its tail, and the tail still to be read. */
export type Head = { head: ParsedQuantity; rest: string };

export function quantityOf(number: NumberText, unit: string, printed: string): ParsedQuantity {
  const { decimalText, decimals, start, end, grouped, power } = number;
  const bareDecimalPoint = /^[^\d.]*\./.test(printed.slice(start, end));
  return {
    magnitude: Number(decimalText),
    decimalText,
    unit,
    decimals,
    printed,
    layout: {
      start,
      end,
      notation: 'decimal',
      grouped,
      bareDecimalPoint,
      ...(power === undefined ? {} : { power }),
    },
  };
}
