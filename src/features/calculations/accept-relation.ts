import type { RelationProposal } from '#shared/api/calculations.ts';
import type { QuantityInput } from '#shared/api/quantities.ts';
import { proposeName } from '#shared/calc/propose-name.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';

/** A number of a proposal, with the name that it would get as a quantity; null where it is one already. */
export type Naming = { id: string; text: string; pageId: string; symbol: string; label: string; isNew: boolean };

/** Names for the numbers that are no quantities yet, from the words ahead of them, each another. */
export function namingsFor(proposal: RelationProposal, taken: readonly string[]): Naming[] {
  const used = [...taken];
  return proposal.numbers.map(({ id, text, pageId, label: words, symbol }) => {
    if (symbol !== null) return { id, text, pageId, symbol, label: '', isNew: false };
    const { label, symbol: name } = proposeName(words, used);
    used.push(name);
    return { id, text, pageId, symbol: name, label, isNew: true };
  });
}

/** The quantities to add, in an order in which each follows what its expression names. The target is worked out, the rest are constants. */
export function quantitiesFor({ target, expression }: RelationProposal, namings: readonly Naming[]): QuantityInput[] {
  const named = new Map(namings.map(({ id, symbol }) => [id, symbol]));
  const isTarget = ({ id, symbol }: Naming): boolean => id === target || symbol === target;
  return namings
    .filter(({ isNew }) => isNew)
    .sort((a, b) => Number(isTarget(a)) - Number(isTarget(b)))
    .map((naming) => {
      const { symbol, label, text, pageId } = naming;
      const common = { symbol, label, unit: unitAsPrinted(text), printed: { text }, pageId };
      if (!isTarget(naming)) return { ...common, kind: 'constant' as const };
      return { ...common, kind: 'derived' as const, expression: withSymbols(expression, named) };
    });
}

/** An expression over ids as one over symbols. */
export const withSymbols = (expression: string, named: ReadonlyMap<string, string>): string =>
  expression.replace(/\b[A-Za-z_]\w*\b/g, (word) => named.get(word) ?? word);

/** The unit in the spelling of the print, which is how the value will be printed again. */
function unitAsPrinted(text: string): string {
  const parsed = parseQuantity(text);
  if (!parsed.ok || parsed.value.unit === '') return '';
  return /[A-Za-zµΩ°%/]+$/.exec(text.trim())?.[0] ?? parsed.value.unit;
}
