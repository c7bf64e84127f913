import { type PrintedNumber as RelatedNumber, readPrintedNumber } from '#shared/relations/printed-number.ts';
import { proposeRelations } from '#shared/relations/propose.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import type { PrintedNumber } from './printed-number.ts';

const idOf = (index: number): string => `n${index + 1}`;

/**
 * For each printed number the formula over the manual's quantities that gives it, where one does that is hardly chance;
 * undefined for the others.
 */
export function relationsAmong(
  { quantities, home }: Pick<LiveStore, 'quantities' | 'home'>,
  numbers: readonly PrintedNumber[],
): (string | undefined)[] {
  const known = quantities.flatMap(({ symbol, label, pageId }): RelatedNumber[] => {
    const place = { id: symbol, symbol, label, page: pageId ?? '' };
    const number = readPrintedNumber(home[symbol]?.text ?? '', place);
    return number === undefined ? [] : [number];
  });
  const printed = numbers.flatMap(({ text }, index): RelatedNumber[] => {
    const number = readPrintedNumber(withoutTolerance(text), { id: idOf(index), page: 'here' });
    return number === undefined ? [] : [number];
  });
  const proposals = proposeRelations([...known, ...printed]).filter(({ table }) => table === undefined);
  const given = new Map(proposals.map(({ target, expression }) => [target, expression]));
  const symbols = new Set(quantities.map(({ symbol }) => symbol));
  return numbers.map((_, index) => overSymbols(idOf(index), given, symbols));
}

/** The formula of a printed number, with those of the other printed numbers in it put in their place. */
function overSymbols(id: string, given: ReadonlyMap<string, string>, symbols: ReadonlySet<string>): string | undefined {
  const expression = given.get(id);
  const others = new Map([...given].filter(([target]) => target !== id));
  let isWhole = expression !== undefined;
  const written = expression?.replace(/\bn\d+\b/g, (name) => {
    if (symbols.has(name)) return name;
    const inside = overSymbols(name, others, symbols);
    isWhole &&= inside !== undefined;
    return `(${inside ?? name})`;
  });
  return isWhole ? written : undefined;
}

const withoutTolerance = (text: string): string => text.replace(/\s?±.*$/, '');
