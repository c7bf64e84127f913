import { type Quantity, type QuantityInput, quantityInput } from '#shared/api/quantities.ts';

/** A quantity as it is typed: every field a text. */
export type TypedQuantity = {
  symbol: string;
  label: string;
  kind: Quantity['kind'];
  unit: string;
  expression: string;
  home: string;
  integer: boolean;
  printed: string;
  pageId: string;
  decimals: string;
  toleranceKind: 'none' | 'absolute' | 'percent' | 'ppm';
  plus: string;
  minus: string;
  low: string;
  high: string;
};

export const untyped: TypedQuantity = {
  symbol: '',
  label: '',
  kind: 'input',
  unit: '',
  expression: '',
  home: '',
  integer: false,
  printed: '',
  pageId: '',
  decimals: '',
  toleranceKind: 'none',
  plus: '',
  minus: '',
  low: '',
  high: '',
};

const text = (value: string | number | undefined): string => (value === undefined ? '' : String(value));

export function typedFrom(quantity: Quantity): TypedQuantity {
  const { symbol, label, kind, unit, expression, home, integer, printed, pageId, display, tolerance, limits } =
    quantity;
  return {
    ...{ symbol, label, kind, unit, integer: integer ?? false },
    ...{ expression: text(expression), home: text(home), printed: text(printed?.text), pageId: pageId ?? '' },
    decimals: text(display?.decimals),
    toleranceKind: tolerance?.kind ?? 'none',
    ...{ plus: text(tolerance?.plus), minus: text(tolerance?.minus) },
    ...{ low: text(limits?.low), high: text(limits?.high) },
  };
}

const plainNumber = /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i;

/** A number where a number was typed; text with a unit stays text, which the server reads. */
function numberOrText(typed: string): number | string | undefined {
  const trimmed = typed.trim();
  if (trimmed === '') return undefined;
  return plainNumber.test(trimmed) ? Number(trimmed) : trimmed;
}

const numberOrNothing = (typed: string): number | undefined => (typed.trim() === '' ? undefined : Number(typed.trim()));

/** The quantity that was typed, without the keys that say nothing. What belongs to another kind is left out. */
function given(typed: TypedQuantity): Record<string, unknown> {
  const { symbol, label, kind, unit, integer, printed, pageId, decimals, toleranceKind, plus, minus, low, high } =
    typed;
  const isDerived = kind === 'derived';
  const plusNumber = numberOrNothing(plus);
  const all: Record<string, unknown> = {
    ...{ symbol: symbol.trim(), label: label.trim(), kind, unit: unit.trim() },
    expression: isDerived ? typed.expression.trim() : undefined,
    home: isDerived ? undefined : numberOrText(typed.home),
    integer: integer ? true : undefined,
    printed: printed.trim() === '' ? undefined : { text: printed.trim() },
    pageId: pageId === '' ? undefined : pageId,
    display: decimals.trim() === '' ? undefined : { decimals: Number(decimals) },
    tolerance:
      toleranceKind === 'none'
        ? undefined
        : { kind: toleranceKind, plus: plusNumber, minus: numberOrNothing(minus) ?? plusNumber },
    limits:
      low.trim() === '' && high.trim() === ''
        ? undefined
        : present({ low: numberOrNothing(low), high: numberOrNothing(high) }),
  };
  return present(all);
}

const present = (all: Record<string, unknown>): Record<string, unknown> =>
  Object.fromEntries(Object.entries(all).filter(([, value]) => value !== undefined));

export type Fault = { field: keyof TypedQuantity; message: string };
type Read = { ok: true; quantity: QuantityInput } | { ok: false; faults: Fault[] };

/** Checks what was typed with the same schema as the server does. */
export function readTyped(typed: TypedQuantity): Read {
  const read = quantityInput.safeParse(given(typed));
  if (read.success) return { ok: true, quantity: read.data };
  return {
    ok: false,
    faults: read.error.issues.map(({ path, message }) => ({ field: fieldAt(path.join('.')), message: plain(message) })),
  };
}

/** The library's own words for a missing number are not for people. */
const plain = (message: string): string => (/^Invalid input|expected/i.test(message) ? 'Give a number.' : message);

const fields: readonly [RegExp, keyof TypedQuantity][] = [
  [/^limits\.high/, 'high'],
  [/^limits/, 'low'],
  [/^tolerance\.minus/, 'minus'],
  [/^tolerance/, 'plus'],
  [/^display/, 'decimals'],
  [/^printed/, 'printed'],
];

/** The field of the form that a path of the schema belongs to. */
export function fieldAt(path: string): keyof TypedQuantity {
  const found = fields.find(([pattern]) => pattern.test(path));
  if (found !== undefined) return found[1];
  const [name = ''] = path.split('.');
  return name in untyped ? (name as keyof TypedQuantity) : 'symbol';
}

const droppable = ['expression', 'home', 'integer', 'printed', 'pageId', 'display', 'tolerance', 'limits'] as const;

/** The whole of it as a change: what is no longer there is taken away by name. */
export const asChange = (quantity: QuantityInput): Record<string, unknown> => ({
  ...Object.fromEntries(droppable.map((key) => [key, null])),
  ...quantity,
});
