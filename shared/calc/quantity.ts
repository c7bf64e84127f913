import { z } from 'zod';
import { findUnit } from '#shared/units/definitions.ts';
import { symbolObjection } from '#shared/expressions/names.ts';

/** A named number of a manual. `home` as a number is in `unit`; as text it may carry its own unit. */
export const quantityDefinition = z
  .object({
    symbol: z.string().min(1).max(60),
    label: z.string().max(200),
    kind: z.enum(['input', 'derived', 'constant']),
    /** Any spelling of the table of units, '' for a plain number. Kept as written: it is how the value is printed. */
    unit: z.string().max(20),
    expression: z.string().max(2000).optional(),
    home: z.union([z.number(), z.string().max(120)]).optional(),
    integer: z.boolean().optional(),
    printed: z.object({ text: z.string().max(120) }).optional(),
    /** `plus` and `minus` without sign; an absolute tolerance is in `unit`. */
    tolerance: z
      .object({
        kind: z.enum(['absolute', 'percent', 'ppm']),
        plus: z.number().nonnegative(),
        minus: z.number().nonnegative(),
      })
      .optional(),
    display: z
      .object({
        decimals: z.number().int().min(0).max(15).optional(),
        significant: z.number().int().min(1).max(15).optional(),
      })
      .optional(),
    /** In `unit`. */
    limits: z.object({ low: z.number().optional(), high: z.number().optional() }).optional(),
  })
  .superRefine((quantity, context) => {
    for (const { path, message } of objectionsTo(quantity)) context.addIssue({ code: 'custom', path: [path], message });
  });

export type QuantityDefinition = z.infer<typeof quantityDefinition>;

type Rule = { path: string; message: string; breaks: (quantity: QuantityShape) => boolean };
type QuantityShape = {
  kind: string;
  expression?: string | undefined;
  home?: unknown;
  printed?: unknown;
  limits?: { low?: number | undefined; high?: number | undefined } | undefined;
};

const kindRules: readonly Rule[] = [
  {
    path: 'expression',
    message: 'A derived quantity needs an expression.',
    breaks: ({ kind, expression }) => kind === 'derived' && (expression ?? '').trim() === '',
  },
  {
    path: 'home',
    message: 'A derived quantity has no home value: its expression gives it.',
    breaks: ({ kind, home }) => kind === 'derived' && home !== undefined,
  },
  {
    path: 'expression',
    message: 'Only a derived quantity has an expression.',
    breaks: ({ kind, expression }) => kind !== 'derived' && expression !== undefined,
  },
  {
    path: 'home',
    message: 'A constant needs a home value or a printed one.',
    breaks: ({ kind, home, printed }) => kind === 'constant' && home === undefined && printed === undefined,
  },
  {
    path: 'limits',
    message: 'The low limit is above the high one.',
    breaks: ({ limits }) => limits?.low !== undefined && limits.high !== undefined && limits.low > limits.high,
  },
];

function objectionsTo(quantity: QuantityShape & { symbol: string; unit: string }): { path: string; message: string }[] {
  const objections = kindRules.filter(({ breaks }) => breaks(quantity)).map(({ path, message }) => ({ path, message }));
  const unit = findUnit(quantity.unit);
  if (!unit.ok) objections.push({ path: 'unit', message: unit.error.message });
  const symbol = symbolObjection(quantity.symbol);
  if (symbol !== undefined) objections.push({ path: 'symbol', message: symbol });
  return objections;
}
