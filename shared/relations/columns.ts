import type { Node } from './nodes.ts';
import { gridOf, type PrintedNumber } from './printed-number.ts';

/** k a = m b + offset, row by row, for two columns of one table; or a = b + sign c for three. k or m is 1. */
export type ColumnRelation = {
  table: string;
  a: string;
  b: string;
  k: number;
  m: number;
  /** In base units: a value of the text, or a number of its own, or nothing. */
  offset: { value: number; node: Node | undefined } | undefined;
  third: { name: string; sign: 1 | -1 } | undefined;
  /** Rows that it holds in, and rows that have both numbers. */
  holds: number[];
  rows: number;
  expected: number;
};

export type Column = {
  table: string;
  title: string | undefined;
  name: string;
  dimension: string;
  unit: string;
  cells: ReadonlyMap<number, PrintedNumber>;
};

const leastRows = 4;
/** A column formula may have exceptions, which are misprints or another rule; not more than these. */
const leastShare = 0.75;
/** Multiplications up to here are tried. */
const largestFactor = 128;

export function columnsOf(numbers: readonly PrintedNumber[]): Column[] {
  const columns = new Map<string, Column & { cells: Map<number, PrintedNumber> }>();
  for (const number of numbers) {
    if (number.column === undefined) continue;
    const { table, title, name, row } = number.column;
    const key = `${table}\n${name}\n${number.dimension}`;
    const column = columns.get(key) ?? {
      table,
      title,
      name,
      dimension: number.dimension,
      unit: number.unit,
      cells: new Map(),
    };
    column.cells.set(row, number);
    columns.set(key, column);
  }
  return [...columns.values()].filter(({ cells }) => cells.size >= leastRows);
}

/** Every column of a table against every other one, and pairs of them against a third. */
export function findColumnRelations(columns: readonly Column[], nodes: readonly Node[]): ColumnRelation[] {
  return columns.flatMap((a) => {
    const others = columns.filter((each) => each !== a && each.table === a.table);
    const pairs = others.flatMap((b) => fitPair(a, b, nodes) ?? []);
    return [...pairs, ...others.flatMap((b) => fitThirds([a, b], others))];
  });
}

function fitThirds([a, b]: readonly [Column, Column], others: readonly Column[]): ColumnRelation[] {
  return others.flatMap((c) => {
    if (c === b) return [];
    const difference = fitThree([a, b, c], -1) ?? [];
    // b + c is found once.
    return b.name > c.name ? difference : [fitThree([a, b, c], 1) ?? [], difference].flat();
  });
}

type Row = { row: number; a: PrintedNumber; b: PrintedNumber };

function rowsOf(a: Column, b: Column): Row[] {
  return [...a.cells].flatMap(([row, cell]) => {
    const other = b.cells.get(row);
    return other === undefined ? [] : [{ row, a: cell, b: other }];
  });
}

function fitPair(a: Column, b: Column, nodes: readonly Node[]): ColumnRelation | undefined {
  const rows = rowsOf(a, b).sort((p, q) => p.b.value - q.b.value);
  if (a.dimension !== b.dimension || a.dimension === 'plain number' || rows.length < leastRows) return undefined;
  let best: ColumnRelation | undefined;
  for (const { k, m } of factorsOf(rows)) {
    const relation = fitOffset({ a, b, rows, k, m }, nodes);
    if (relation !== undefined && (best === undefined || relation.expected < best.expected)) best = relation;
  }
  return best;
}

/** Slopes between far rows, as k or 1/k. Several pairs, so that one misprint cannot hide a formula. */
function factorsOf(rows: readonly Row[]): { k: number; m: number }[] {
  const half = Math.floor(rows.length / 2);
  const found = new Map<string, { k: number; m: number }>();
  for (let at = 0; at + half < rows.length; at += 1) {
    const [from, to] = [rows[at], rows[at + half]];
    if (from === undefined || to === undefined) continue;
    const [rise, run] = [to.a.value - from.a.value, to.b.value - from.b.value];
    if (rise === 0 || run === 0) continue;
    const [m, k] = [Math.round(rise / run), Math.round(run / rise)];
    const slack = to.a.grain + from.a.grain;
    if (m >= 1 && m <= largestFactor && Math.abs(rise - m * run) <= slack + m * (to.b.grain + from.b.grain))
      found.set(`1 ${m}`, { k: 1, m });
    if (k > 1 && k <= largestFactor && Math.abs(k * rise - run) <= k * slack + to.b.grain + from.b.grain)
      found.set(`${k} 1`, { k, m: 1 });
  }
  return [...found.values()];
}

type Fit = { a: Column; b: Column; rows: readonly Row[]; k: number; m: number };

function fitOffset({ a, b, rows, k, m }: Fit, nodes: readonly Node[]): ColumnRelation | undefined {
  const rest = (each: Row): number => k * each.a.value - m * each.b.value;
  const slack = (each: Row): number => (k * each.a.grain + m * each.b.grain) / 2 + 1e-12 * Math.abs(each.b.value);
  const middle = median(rows.map(rest));
  const widest = Math.max(...rows.map(slack));
  const offset = nameOffset({ middle, slack: widest, dimension: a.dimension }, nodes);
  const holds = rows.filter((each) => Math.abs(rest(each) - (offset?.value ?? 0)) <= slack(each));
  if (holds.length < Math.max(leastRows, leastShare * rows.length)) return undefined;
  const finest = Math.max(
    ...rows.map(slack),
    Math.min(...rows.map((each) => Math.min(k * gridOf(each.a), m * gridOf(each.b)))),
  );
  return {
    table: a.table,
    a: a.name,
    b: b.name,
    k,
    m,
    offset,
    third: undefined,
    holds: holds.map(({ row }) => row),
    rows: rows.length,
    expected: chanceOf(
      rows.map(({ b: cell }) => cell.value * m),
      2 * finest,
      holds.length - (offset === undefined ? 0 : 1),
    ),
  };
}

/** Zero, a value of the manual, or what the middle row says, to its digits. */
function nameOffset(
  { middle, slack, dimension }: { middle: number; slack: number; dimension: string },
  nodes: readonly Node[],
): ColumnRelation['offset'] {
  if (Math.abs(middle) <= slack) return undefined;
  const matches = nodes.filter(
    (node) =>
      node.inText && node.dimension === dimension && Math.abs(node.value - Math.abs(middle)) <= slack + node.grain / 2,
  );
  const node = matches.toSorted((p, q) => q.mentions - p.mentions)[0];
  if (node !== undefined) return { value: Math.sign(middle) * node.value, node };
  const digit = 10 ** Math.floor(Math.log10(2 * slack));
  return { value: Math.round(middle / digit) * digit, node: undefined };
}

function fitThree([a, b, c]: readonly [Column, Column, Column], sign: 1 | -1): ColumnRelation | undefined {
  if (a.dimension !== b.dimension || b.dimension !== c.dimension || a.dimension === 'plain number') return undefined;
  const rows = rowsOf(a, b).flatMap((each) => {
    const third = c.cells.get(each.row);
    return third === undefined ? [] : [{ ...each, c: third }];
  });
  if (rows.length < leastRows || new Set(rows.map((each) => each.c.value)).size < leastRows) return undefined;
  const holds = rows.filter((each) => {
    const slack = (each.a.grain + each.b.grain + each.c.grain) / 2;
    return Math.abs(each.a.value - each.b.value - sign * each.c.value) <= slack + 1e-12 * each.b.value;
  });
  if (holds.length < Math.max(leastRows, leastShare * rows.length)) return undefined;
  const grain = Math.max(...rows.map((each) => Math.min(gridOf(each.a), gridOf(each.b), gridOf(each.c))));
  return {
    table: a.table,
    a: a.name,
    b: b.name,
    k: 1,
    m: 1,
    offset: undefined,
    third: { name: c.name, sign },
    holds: holds.map(({ row }) => row),
    rows: rows.length,
    expected: chanceOf(
      rows.map((each) => each.a.value),
      grain,
      holds.length,
    ),
  };
}

/** Each row must fall within `width` out of the spread of the column; the choice of two or three columns is small against that. */
function chanceOf(values: readonly number[], width: number, holding: number): number {
  const spread = Math.max(...values) - Math.min(...values);
  const one = spread === 0 ? 1 : Math.min(1, width / spread);
  return Math.max(1e-30, 100 * one ** Math.max(0, holding));
}

function median(values: readonly number[]): number {
  const sorted = values.toSorted((p, q) => p - q);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
}
