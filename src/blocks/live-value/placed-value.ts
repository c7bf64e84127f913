import type { Quantity } from '#shared/api/quantities.ts';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import { formatLikePrinted } from '#shared/units/format-quantity.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';

/** One place in a page: what the paper says there, and what the value is at the setting, written as the paper writes it there. */
export type PlacedValue = {
  printed: string;
  /** '' where the value is not available. */
  asSet: string;
  isMoved: boolean;
  /** Why there is no value. */
  missing: string | undefined;
  isOutsideLimits: boolean;
};

export function placeValue({ unit }: Pick<Quantity, 'unit'>, value: LiveValue, printed: string): PlacedValue {
  const isOutsideLimits = value.limitsBroken === true;
  if (value.value === null) {
    return {
      printed,
      asSet: '',
      isMoved: false,
      missing: value.problem?.message ?? 'It has no value.',
      isOutsideLimits,
    };
  }
  const asSet = parseQuantity(printed).ok ? formatLikePrinted(value.value, unit, printed) : value.text;
  return { printed, asSet, isMoved: asSet !== printed, missing: undefined, isOutsideLimits };
}
