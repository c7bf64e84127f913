import { counted } from '#shared/kit/counted.ts';
import { fromBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';
import type { Candidate } from './candidates.ts';
import type { Column, ColumnRelation } from './columns.ts';
import type { Node } from './nodes.ts';
import type { PrintedNumber } from './printed-number.ts';
import type { RelationProposal } from './propose.ts';

type Written = Omit<RelationProposal, 'score' | 'table'>;

const nameOf = ({ number }: Node): string => number.symbol ?? number.id;
const longestLabel = 3;
const callOf = ({ number: { label = '', text } }: Node): string => {
  const words = label.trim().split(/\s+/);
  return label.trim() === '' || words.length > longestLabel ? text.trim() : `${label.trim()} (${text.trim()})`;
};

export function writeTerms(candidate: Candidate): Written {
  const { factor, x, y, z, sign } = candidate;
  const k = factor.k;
  const others = z === undefined ? [y] : [y, z];
  const target = targetOf(candidate);
  const write = (nameOfNode: (node: Node) => string): string => {
    const [a, b] = [nameOfNode(x), nameOfNode(y)];
    const c = z === undefined ? undefined : nameOfNode(z);
    if (target === x) {
      if (c === undefined) return `${b} / ${k}`;
      const sum = `${b} ${sign === 1 ? '+' : '-'} ${c}`;
      return k === 1 ? sum : `(${sum}) / ${k}`;
    }
    const product = k === 1 ? a : `${k} * ${a}`;
    if (c === undefined) return product;
    if (target === y) return `${product} ${sign === 1 ? '-' : '+'} ${c}`;
    return sign === 1 ? `${product} - ${b}` : `${b} - ${product}`;
  };
  const printed = write(({ number }) => number.text.trim());
  const ids = [x, ...others].map(({ number }) => number.id);
  return {
    target: nameOf(target),
    expression: write(nameOf),
    filled: `${target.number.text.trim()} = ${printed}`,
    numbers: factor.number === undefined ? ids : [...ids, factor.number.id],
    says: `${sentenceCase(callOf(target))} is ${write(callOf).replaceAll(' * ', ' × ')}, to the digits printed.`,
  };
}

/**
 * The number that the others give, to its own printed digits. A quotient where dividing left more digits, else the one
 * printed least often: what is worked out stands in one place, what it is worked out from in many. Of equals, the later one.
 */
function targetOf({ factor, x, y, z, sign }: Candidate): Node {
  const rest = Math.abs(factor.k * x.value - y.value - sign * (z?.value ?? 0)) - 1e-12 * y.value;
  const terms = [
    { node: x, times: factor.k },
    { node: y, times: 1 },
    ...(z === undefined ? [] : [{ node: z, times: 1 }]),
  ];
  const able = terms.filter(({ node, times }) => rest <= (times * node.grain) / 2).map(({ node }) => node);
  const fair = able.length === 0 ? terms.map(({ node }) => node) : able;
  const isQuotient = factor.k > 1 && x.grid < Math.min(y.grid, z?.grid ?? Infinity);
  if (isQuotient && fair.includes(x)) return x;
  const whole = fair.filter((node) => factor.k === 1 || node !== x);
  return (whole.length === 0 ? fair : whole).reduce(rarer);
}

function rarer(a: Node, b: Node): Node {
  if (a.mentions !== b.mentions) return a.mentions < b.mentions ? a : b;
  return (a.places[0] ?? 0) > (b.places[0] ?? 0) ? a : b;
}

const sentenceCase = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

type WrittenTable = Written & Pick<RelationProposal, 'table'>;

/** A column as a formula of another; a formula that no name fits is spelled with the names of the columns. */
export function writeColumns(relation: ColumnRelation, columns: readonly Column[]): WrittenTable {
  const { table, a, b, third, holds, rows } = relation;
  const at = (name: string): Column | undefined => columns.find((each) => each.table === table && each.name === name);
  const first = holds[0] ?? 0;
  const cell = (name: string): PrintedNumber | undefined => at(name)?.cells.get(first);
  const printed = (name: string): string => cell(name)?.text.trim() ?? name;
  const unit = at(a)?.unit ?? '';
  const write = (column: Words['column'], node: Words['node']): string => rightSide(relation, { column, node, unit });
  const printedNode = ({ number }: Node): string => number.text.trim();
  const names = [a, b, ...(third === undefined ? [] : [third.name])];
  const offsetId = relation.offset?.node?.number.id;
  const missing = [...(at(a)?.cells.keys() ?? [])].filter(
    (row) => at(b)?.cells.has(row) === true && !holds.includes(row),
  );
  const share = holds.length === rows ? `all ${rows} rows` : `${holds.length} of ${counted(rows, 'row')}`;
  return {
    target: symbolOfColumn(a),
    expression: write(symbolOfColumn, nameOf),
    filled: `${printed(a)} = ${write(printed, printedNode)}`,
    numbers: [...names.flatMap((name) => cell(name)?.id ?? []), ...(offsetId === undefined ? [] : [offsetId])],
    table: { table, holds: holds.length, rows, failing: missing },
    says: `${placeOf(at(a))}, ${a} is ${write((name) => name, printedNode).replaceAll(' * ', ' × ')} in ${share}.`,
  };
}

const placeOf = (column: Column | undefined): string =>
  column?.title === undefined ? 'Down the table' : `In ${column.title}`;

/** A name for a column that formulas take: letters, digits and _. */
export const symbolOfColumn = (name: string): string => {
  const word = name
    .trim()
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '_')
    .replace(/^_+|_+$/g, '');
  return /^[a-z]/.test(word) ? `column_${word}` : `column_${word || 'unnamed'}`;
};

type Words = { column: (name: string) => string; node: (node: Node) => string; unit: string };

function rightSide({ b, k, m, offset, third }: ColumnRelation, { column, node, unit }: Words): string {
  const base = m === 1 ? column(b) : `${m} * ${column(b)}`;
  const added =
    offset === undefined
      ? base
      : `${base} ${offset.value < 0 ? '-' : '+'} ${offset.node === undefined ? literal(Math.abs(offset.value), unit) : node(offset.node)}`;
  const sum = third === undefined ? added : `${added} ${third.sign === 1 ? '+' : '-'} ${column(third.name)}`;
  if (k === 1) return sum;
  return sum === base ? `${base} / ${k}` : `(${sum}) / ${k}`;
}

function literal(base: number, unit: string): string {
  const found = findUnit(unit);
  const value = found.ok ? fromBase(base, found.value) : base;
  return `${Number(value.toPrecision(12))} ${unit}`.trim();
}
