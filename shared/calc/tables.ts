import type { TableColumn, TableView } from '#shared/expressions/scope.ts';
import { fromBase, toBase } from '#shared/units/convert.ts';
import { dimensionOf, findUnit, type UnitDefinition } from '#shared/units/definitions.ts';

/** A printed table that formulas look into: each row is the key and then one value per column, in the units of the heads. */
export type LookupTable = {
  id: string;
  title: string;
  source: string;
  key: { name: string; unit: string };
  columns: { name: string; unit: string }[];
  rows: readonly (readonly number[])[];
  /** What each row stands for, where its key is only a number in a list. */
  rowNames?: readonly string[];
};

/** A table whose rows are made when first looked at: a plan by rule costs nothing until a formula uses it. */
export function lazyTable(
  head: Omit<LookupTable, 'rows'>,
  makeRows: () => readonly (readonly number[])[],
): LookupTable {
  let rows: readonly (readonly number[])[] | undefined;
  return {
    ...head,
    get rows() {
      return (rows ??= makeRows());
    },
  };
}

/** The same table for formulas: base units, one step per look. Null where a unit of its heads is unknown. */
export function viewTable(table: LookupTable): TableView | null {
  const keyUnit = findUnit(table.key.unit);
  if (!keyUnit.ok) return null;
  let rowOf: Map<number, number> | undefined;
  const findRow = (key: number): number => {
    rowOf ??= new Map(table.rows.map((row, at) => [keyGrain(toBase(row[0] ?? NaN, keyUnit.value)), at]));
    return rowOf.get(keyGrain(key)) ?? -1;
  };
  const columns = new Map<string, TableColumn>();
  for (const [at, { name, unit }] of table.columns.entries()) {
    const found = findUnit(unit);
    if (!found.ok) return null;
    let values: number[] | undefined;
    columns.set(name, {
      dimension: dimensionOf(found.value),
      read: (key) => (values ??= table.rows.map((row) => toBase(row[at + 1] ?? NaN, found.value)))[findRow(key)] ?? NaN,
    });
  }
  return {
    title: table.title,
    keyDimension: dimensionOf(keyUnit.value),
    columns,
    explainMiss: (key) => explainMiss(table, keyUnit.value, key),
  };
}

/** Keys agree to twelve digits: a computed key may carry a double's last bits. */
const keyGrain = (key: number): number => (Number.isInteger(key) ? key : Number(key.toPrecision(12)));

function explainMiss(table: LookupTable, unit: UnitDefinition, key: number): string {
  const shown = `${Number(fromBase(key, unit).toPrecision(9))}${unit.symbol === '' ? '' : ` ${table.key.unit}`}`;
  const name = table.key.name.charAt(0).toUpperCase() + table.key.name.slice(1);
  return `${name} ${shown} is not in "${table.title}", which has ${describeKeys(table)}.`;
}

/** `1 to 28 and 60 to 88`: runs of whole numbers, or the first and last key where there are none. */
export function describeKeys(table: LookupTable): string {
  const keys = table.rows.map((row) => row[0] ?? NaN).sort((a, b) => a - b);
  const runs: [number, number][] = [];
  for (const key of keys) {
    const last = runs.at(-1);
    if (last !== undefined && key === last[1] + 1) last[1] = key;
    else runs.push([key, key]);
  }
  const first = keys[0];
  if (first === undefined) return 'no rows';
  // Past this many runs a list helps nobody.
  if (runs.length > 8) return `keys from ${first} to ${keys.at(-1) ?? first}, with gaps`;
  const words = runs.map(([from, to]) => (from === to ? `${from}` : `${from} to ${to}`));
  return words.length === 1 ? `${words[0] ?? ''}` : `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`;
}
