import { childrenOf, type ExpressionNode } from '#shared/expressions/tree.ts';
import type { Program } from '#shared/calc/program.ts';
import { describeKeys, type LookupTable } from '#shared/calc/tables.ts';

/** What an input may be, where a printed table is looked into with it: its keys in order, and in words. */
export type InputKeys = { keys: readonly number[]; words: string };

export function inputKeys(program: Program, symbol: string): InputKeys | null {
  const table = tableOf(program, symbol);
  if (table === undefined) return null;
  const keys = table.rows.map((row) => row[0] ?? NaN).sort((a, b) => a - b);
  return { keys, words: `${describeKeys(table)}, from "${table.title}"` };
}

function tableOf(program: Program, symbol: string): LookupTable | undefined {
  const input = program.cells[program.slots.get(symbol) ?? -1];
  for (const slot of input?.dependants ?? []) {
    const root = program.cells[slot]?.formula?.expression.root;
    const id = root === undefined ? undefined : lookedInto(root, symbol);
    if (id !== undefined) return program.tables.find((table) => table.id === id);
  }
  return undefined;
}

function lookedInto(node: ExpressionNode, symbol: string): string | undefined {
  if (node.kind === 'lookup' && node.key.kind === 'symbol' && node.key.name === symbol) return node.table;
  for (const child of childrenOf(node)) {
    const found = lookedInto(child, symbol);
    if (found !== undefined) return found;
  }
  return undefined;
}

/** The next key up or down; past a gap in the table it goes on behind the gap. */
export function nextKey({ keys }: InputKeys, from: number, step: 1 | -1): number | undefined {
  return step === 1 ? keys.find((key) => key > from) : keys.findLast((key) => key < from);
}
