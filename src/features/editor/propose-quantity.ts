import type { Quantity } from '#shared/api/quantities.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { compile } from '#shared/calc/program.ts';
import { proof } from '#shared/calc/proof.ts';
import { findUnit } from '#shared/units/definitions.ts';
import { formatLikePrinted } from '#shared/units/format-quantity.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import type { PrintedNumber } from './printed-number.ts';

/** Whether a quantity comes out as this print at home: the same kind of unit, and the same digits once written the same way. */
export function comesOutAs(store: LiveStore, quantity: Quantity, { text, parsed }: PrintedNumber): boolean {
  const home = store.home[quantity.symbol]?.value;
  if (home === null || home === undefined) return false;
  const [own, printed] = [findUnit(quantity.unit), findUnit(parsed.unit)];
  if (!own.ok || !printed.ok || own.value.dimension !== printed.value.dimension) return false;
  return formatLikePrinted(home, quantity.unit, text) === text;
}

/** What a new quantity would come to among those of the manual. */
export type Trial =
  | { state: 'incomplete' }
  | { state: 'problem'; message: string; start?: number; end?: number }
  | { state: 'comes-out'; text: string; agrees: boolean };

/** `tables` are those that the manual's formulas may look into. */
export function tryQuantity(
  { quantities, program: { tables } }: Pick<LiveStore, 'quantities' | 'program'>,
  definition: QuantityDefinition,
): Trial {
  if (definition.kind === 'derived' && (definition.expression ?? '').trim() === '') return { state: 'incomplete' };
  const program = compile([...quantities, definition], tables);
  const value = evaluate(program).values[definition.symbol];
  if (value === undefined) return { state: 'incomplete' };
  if (value.problem !== undefined) return { state: 'problem', ...value.problem };
  const item = proof(program).items.find(({ symbol }) => symbol === definition.symbol);
  return { state: 'comes-out', text: value.text, agrees: item?.agrees ?? true };
}
