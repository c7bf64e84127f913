import { diffArrays } from 'diff';
import type { DocNode } from '#shared/document/define-block.ts';
import { textOf } from '#shared/document/text-of.ts';
import { type Piece, compareWords } from './compare-words.ts';

/** A row as it was and as it is; `older` and `newer` are its places in the two tables, counted from 0. */
export type ComparedRow = {
  change: 'same' | 'changed' | 'gone' | 'new';
  older: number | null;
  newer: number | null;
  cells: Piece[][];
};

const rowsOf = (table: DocNode): string[][] => (table.content ?? []).map((row) => (row.content ?? []).map(textOf));

/** Two states of a table, row by row and cell by cell. Rows that are alike stand beside each other. */
export function compareTables(older: DocNode, newer: DocNode): ComparedRow[] {
  const [before, after] = [rowsOf(older), rowsOf(newer)];
  const runs = diffArrays(
    before.map((row) => JSON.stringify(row)),
    after.map((row) => JSON.stringify(row)),
  );
  let [old, now] = [0, 0];
  /** Rows that went since the last row that stayed: rows that came stand where these were. */
  let gone: number[] = [];
  const places: Places[] = [];
  const close = (): void => {
    places.push(...gone.map((each): Places => [each, null]));
    gone = [];
  };
  for (const { added, removed, count } of runs) {
    if (!added && !removed) close();
    for (let index = 0; index < count; index += 1) {
      if (removed) gone.push(old++);
      else places.push([added ? (gone.shift() ?? null) : old++, now++]);
    }
  }
  close();
  return places.map((each) => rowOf(before, after, each));
}

type Places = readonly [older: number | null, newer: number | null];

function rowOf(before: readonly string[][], after: readonly string[][], [older, newer]: Places): ComparedRow {
  const was = older === null ? [] : (before[older] ?? []);
  const is = newer === null ? [] : (after[newer] ?? []);
  const cells = Array.from({ length: Math.max(was.length, is.length) }, (_, column) =>
    compareWords(was[column] ?? '', is[column] ?? ''),
  );
  const isSame = cells.every((pieces) => pieces.every(({ kind }) => kind === 'same'));
  const change = older === null ? 'new' : newer === null ? 'gone' : isSame ? 'same' : 'changed';
  return { change, older, newer, cells };
}
