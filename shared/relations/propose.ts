import { findCandidates, type Candidate } from './candidates.ts';
import { chanceIn } from './chance.ts';
import { columnsOf } from './columns.ts';
import { bestColumnRelations, rowCandidates } from './table-rows.ts';
import { factorsFor } from './factors.ts';
import { createBasis, type LinearForm } from './linear-basis.ts';
import { nodesOf, type Node } from './nodes.ts';
import type { PrintedNumber } from './printed-number.ts';
import { writeColumns, writeTerms } from './write-relation.ts';

/** A relation that a manual's numbers suggest; a person accepts or rejects it. */
export type RelationProposal = {
  /** Id or symbol of the number that the expression gives; the name of a column for a table. */
  target: string;
  /** In the language of formulas, over ids or symbols; over names of columns for a table. */
  expression: string;
  /** The same with the printed numbers filled in: `16.211111 mc = (156.600 mc - 10.700 mc) / 9`. */
  filled: string;
  /** Ids of the numbers that take part; for a table, of those in its first row that holds. */
  numbers: string[];
  table: { table: string; holds: number; rows: number; failing: number[] } | undefined;
  /** Powers of ten against chance: at 1, ten manuals like this would show one such coincidence; 30 at most. */
  score: number;
  says: string;
};

/** More than one in three manuals by chance is no proposal. */
const mostExpected = 0.3;

/** Relations among the printed numbers of a manual, likeliest first; what follows from better ones is left out. */
export function proposeRelations(numbers: readonly PrintedNumber[]): RelationProposal[] {
  const nodes = nodesOf(numbers);
  const columns = columnsOf(numbers);
  const tables = bestColumnRelations(columns, nodes);
  const rows = rowCandidates(tables, { columns, nodes });
  const settled = new Set(tables.map(({ table }) => table));
  const free = nodes.filter(({ inText, number }) => inText || !settled.has(number.column?.table ?? ''));
  const factors = factorsFor(numbers);
  const candidates = byDimension(free).flatMap((group) =>
    findCandidates(group, { factors, chance: chanceIn(group), most: mostExpected }),
  );
  const proposals = [
    ...tables.map((each) => ({ ...writeColumns(each, columns), score: scoreOf(each.expected) })),
    ...chooseCandidates([...rows, ...candidates], nodes).map((each) => ({
      ...writeTerms(each),
      table: undefined,
      score: scoreOf(each.expected),
    })),
  ];
  return proposals.sort((a, b) => b.score - a.score);
}

/**
 * Best first; what follows from those before it is left out, and so is what fits only because a better one nearly is it.
 * Of several that say the same, given those before, the plainest is written, at the best one's chance.
 */
function chooseCandidates(candidates: readonly Candidate[], nodes: readonly Node[]): Candidate[] {
  const basis = createBasis();
  const chosen: Candidate[] = [];
  let left = candidates.toSorted((a, b) => a.expected - b.expected).map((each) => ({ each, form: formOf(each) }));
  for (let first = left[0]; first !== undefined; first = left[0]) {
    const { each, form } = first;
    left = left.slice(1);
    if (basis.implies(form) || nearCopiesOf(each, nodes).some((copy) => basis.implies(formOf(copy)))) continue;
    const residue = basis.residue(form);
    const alike = left.filter((other) => basis.residue(other.form) === residue);
    const plainest = alike.reduce((best, other) => (effortOf(other.each) < effortOf(best) ? other.each : best), each);
    basis.add(form);
    left = left.filter((other) => !alike.includes(other));
    chosen.push({ ...plainest, expected: each.expected });
  }
  return chosen;
}

/** What an inexact relation costs, in steps of its factor. */
const effortOfRounding = 3;
const effortOf = ({ factor, x, y, z, sign }: Candidate): number => {
  const rest = factor.k * x.value - y.value - sign * (z?.value ?? 0);
  const isExact = Math.abs(rest) < 1e-9 * y.value;
  return factor.k + (z === undefined ? 0 : 1) + (isExact ? 0 : effortOfRounding);
};

/** How many roundings apart two values, such as a value and its limits, may be taken for each other. */
const nearRoundings = 4;

/** The same relation with one value changed for another that the rounding hardly tells apart. */
function nearCopiesOf(candidate: Candidate, nodes: readonly Node[]): Candidate[] {
  const { factor, x, y, z } = candidate;
  const rounding = factor.k * x.grain + y.grain + (z?.grain ?? 0);
  return (['x', 'y', 'z'] as const).flatMap((part) => {
    const own = candidate[part];
    if (own === undefined) return [];
    const reach = (nearRoundings * rounding) / (part === 'x' ? factor.k : 1);
    return nodes
      .filter((node) => node !== own && node.dimension === own.dimension && Math.abs(node.value - own.value) <= reach)
      .map((node) => ({ ...candidate, [part]: node }));
  });
}

const scoreOf = (expected: number): number => -Math.log10(Math.max(expected, 1e-30));

function byDimension(nodes: readonly Node[]): Node[][] {
  const groups = new Map<string, Node[]>();
  for (const node of nodes) groups.set(node.dimension, [...(groups.get(node.dimension) ?? []), node]);
  return [...groups.values()];
}

const keyOf = ({ at }: Node): string => `n${at}`;

function formOf({ factor, x, y, z, sign }: Candidate): LinearForm {
  const form = new Map<string, number>();
  const add = (node: Node, times: number): unknown => form.set(keyOf(node), (form.get(keyOf(node)) ?? 0) + times);
  add(x, factor.k);
  add(y, -1);
  if (z !== undefined) add(z, -sign);
  return form;
}
