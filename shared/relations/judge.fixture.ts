import { parseExpression } from '#shared/expressions/parse-expression.ts';
import type { ExpressionNode } from '#shared/expressions/tree.ts';
import { createBasis } from './linear-basis.ts';
import type { MadeUpManual } from './made-up-manuals.fixture.ts';
import type { RelationProposal } from './propose.ts';

type Form = Map<string, number>;

/** `other3~2`, the second print of a number, is that number. */
const nameOf = (id: string): string => id.replace(/~\d+$/, '');

/** Ids of the made-up manuals have signs that formulas do not; these stand in for them. */
export const asSymbol = (id: string): string => id.replace('@', '_row_').replace('~', '_print_');
const asId = (symbol: string): string => symbol.replace('_row_', '@').replace('_print_', '~');

/** A proposal as a form that is zero. */
export function formOf({ target, expression }: RelationProposal): Form {
  const parsed = parseExpression(expression);
  if (!parsed.ok) throw new Error(`${expression}: ${parsed.error.message}`);
  return add(linear(parsed.value.root), new Map([[nameOf(asId(target)), 1]]), -1);
}

/** What a formula of columns says of each row. */
function rowFormsOf(proposal: RelationProposal, numbers: MadeUpManual['numbers']): Form[] {
  if (proposal.table === undefined) return [];
  const form = formOf(proposal);
  const rows = new Set(numbers.flatMap(({ column }) => column?.row ?? []));
  return [...rows].map(
    (row) =>
      new Map(
        [...form].map(([key, each]) => {
          const cell = numbers.find(({ column }) => column?.row === row && `column_${column.name}` === key);
          return [cell === undefined ? key : nameOf(cell.id), each];
        }),
      ),
  );
}

function linear(node: ExpressionNode): Form {
  if (node.kind === 'symbol') return new Map([[nameOf(asId(node.name)), 1]]);
  if (node.kind === 'number') return new Map([['1', node.base]]);
  if (node.kind !== 'arithmetic') throw new Error(node.kind);
  const [left, right] = [linear(node.left), linear(node.right)];
  if (node.operator === '+' || node.operator === '-') return add(left, right, node.operator === '+' ? 1 : -1);
  if (node.operator === '*') return times(right, left.get('1') ?? NaN);
  return times(left, 1 / (right.get('1') ?? NaN));
}

const times = (form: Form, factor: number): Form => new Map([...form].map(([key, each]) => [key, each * factor]));
function add(a: Form, b: Form, sign: number): Form {
  const sum = new Map(a);
  for (const [key, each] of b) sum.set(key, (sum.get(key) ?? 0) + sign * each);
  return sum;
}

/** How many of the first five proposals are true, and how many of the true relations follow from all proposals. */
export function judge(
  { truths, numbers }: MadeUpManual,
  proposals: readonly RelationProposal[],
): { first: number; right: number; truths: number; found: number; wrong: RelationProposal[]; missed: Form[] } {
  const [known, proposed] = [createBasis(), createBasis()];
  truths.forEach((form) => known.add(form));
  proposals.forEach((each) => proposed.add(formOf(each)));
  for (const form of proposals.flatMap((each) => rowFormsOf(each, numbers))) proposed.add(form);
  const first = proposals.slice(0, 5);
  const wrong = first.filter((each) => !known.implies(formOf(each)));
  // What a table says row by row is one relation, not one for each row.
  const counted = truths.filter((form) => ![...form.keys()].some((key) => key.includes('@')));
  const missed = counted.filter((form) => !proposed.implies(form));
  return {
    first: first.length,
    right: first.length - wrong.length,
    truths: counted.length,
    found: counted.length - missed.length,
    wrong,
    missed,
  };
}
