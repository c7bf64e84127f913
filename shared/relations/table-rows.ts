import type { Candidate } from './candidates.ts';
import { findColumnRelations, type Column, type ColumnRelation } from './columns.ts';
import { createBasis, type LinearForm } from './linear-basis.ts';
import type { Node } from './nodes.ts';

/** Below this chance, the simpler formula is the better one. */
const certain = 1e-6;
/** Relations of columns that chance explains this often are none. */
const mostExpected = 0.3;

/** Formulas of columns, surest and simplest first; what follows from those before it is left out. */
export function bestColumnRelations(columns: readonly Column[], nodes: readonly Node[]): ColumnRelation[] {
  const basis = createBasis();
  return findColumnRelations(columns, nodes)
    .filter(({ expected }) => expected < mostExpected)
    .sort((a, b) => Math.max(a.expected, certain) - Math.max(b.expected, certain) || preference(a, b, columns))
    .filter((each) => basis.add(columnForm(each)));
}

/** Fewer parts; dividing rather than multiplying, because quotients are what a table is made for; the later column from the earlier. */
function preference(a: ColumnRelation, b: ColumnRelation, columns: readonly Column[]): number {
  const parts = ({ k, m, offset, third }: ColumnRelation): number =>
    Number(k > 1) + Number(m > 1) + Number(offset !== undefined) + Number(third !== undefined);
  const place = (relation: ColumnRelation): number =>
    columns.findIndex(({ table, name }) => table === relation.table && name === relation.a);
  return parts(a) - parts(b) || b.k - a.k || place(b) - place(a);
}

/** Columns as unknowns. */
function columnForm({ table, a, b, k, m, offset, third }: ColumnRelation): LinearForm {
  const form = new Map([
    [`${table} ${a}`, k],
    [`${table} ${b}`, -m],
  ]);
  if (third !== undefined) form.set(`${table} ${third.name}`, -third.sign);
  if (offset !== undefined) form.set(`value ${Math.abs(offset.value)}`, -Math.sign(offset.value));
  return form;
}

/** What holds down a column also holds for the row that the text speaks of, and is as sure there. */
export function rowCandidates(
  relations: readonly ColumnRelation[],
  { columns, nodes }: { columns: readonly Column[]; nodes: readonly Node[] },
): Candidate[] {
  const nodeOf = new Map(nodes.map((node) => [`${node.dimension} ${node.value}`, node]));
  const found: Candidate[] = [];
  for (const relation of relations) {
    const cellAt = (name: string, row: number): Node | undefined => {
      const cell = columns.find((each) => each.table === relation.table && each.name === name)?.cells.get(row);
      const node = cell === undefined ? undefined : nodeOf.get(`${cell.dimension} ${cell.value}`);
      return node?.inText === true ? node : undefined;
    };
    for (const row of relation.holds) {
      const candidate = candidateOf(relation, (name) => cellAt(name, row));
      if (candidate !== undefined) found.push(candidate);
    }
  }
  return found;
}

/** k a = m b + offset or third, as k x = y + sign z; an offset that stands nowhere has no node to name. */
function candidateOf(relation: ColumnRelation, cellAt: (name: string) => Node | undefined): Candidate | undefined {
  const { a, b, k, m, expected } = relation;
  const [from, to, added] = [cellAt(a), cellAt(b), addedTo(relation, cellAt)];
  if (from === undefined || to === undefined || added === undefined) return undefined;
  const { z, sign } = added;
  const factor = { k: Math.max(k, m), prior: 1, number: undefined };
  if (m === 1) return { factor, x: from, y: to, z, sign, expected };
  return { factor, x: to, y: from, z, sign: sign === 1 ? -1 : 1, expected };
}

function addedTo(
  { offset, third }: ColumnRelation,
  cellAt: (name: string) => Node | undefined,
): Pick<Candidate, 'z' | 'sign'> | undefined {
  if (third !== undefined) return named(cellAt(third.name), third.sign);
  return offset === undefined ? { z: undefined, sign: 1 } : named(offset.node, offset.value < 0 ? -1 : 1);
}

const named = (z: Node | undefined, sign: 1 | -1): Pick<Candidate, 'z' | 'sign'> | undefined =>
  z === undefined ? undefined : { z, sign };
