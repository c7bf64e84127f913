import type { Editor } from '@tiptap/core';
import type { Node, Schema } from '@tiptap/pm/model';
import { stringify } from 'csv-stringify/browser/esm/sync';
import type { DocNode } from '#shared/document/define-block.ts';
import { tablesOf } from '#shared/document/tables.ts';
import type { RowChange } from './table-import.ts';
import type { TablePlace } from './table-edits.ts';

/** The table's body rows as plain text, with its columns. */
export function plainTable({ table, columns }: TablePlace): { columns: TablePlace['columns']; rows: string[][] } {
  const [found] = tablesOf({ type: 'doc', content: [table.toJSON() as DocNode] });
  return { columns, rows: found?.rows ?? [] };
}

/** The table as CSV, with its printed headings. A cell that a spreadsheet would take for a formula is made plain text. */
export function tableAsCsv(place: TablePlace): string {
  const { columns, rows } = plainTable(place);
  return stringify([columns.map(({ heading, meaning }) => (heading === '' ? meaning : heading)), ...rows], {
    escape_formulas: true,
  });
}

/** Puts imported rows into the table, all in one step: changed cells are written over, new rows go to its end. */
export function takeRows(editor: Editor, place: TablePlace, changes: readonly RowChange[]): boolean {
  return editor
    .chain()
    .command(({ tr, state }) => {
      const bodyRows: { row: Node; position: number }[] = [];
      place.table.forEach((row, offset) => {
        if (row.attrs['role'] === 'body') bodyRows.push({ row, position: place.position + 1 + offset });
      });
      const end = place.position + place.table.nodeSize - 1;
      const added = changes.flatMap((change) => (change.kind === 'new' ? [rowOf(state.schema, change.cells)] : []));
      tr.insert(end, added);
      // From the end on, so that the places before stay true.
      const changed = changes.flatMap((change) => (change.kind === 'changed' ? [change] : []));
      for (const { at, cells, was } of changed.toSorted((a, b) => b.at - a.at)) {
        const target = bodyRows[at];
        if (target === undefined) continue;
        const places: { cell: Node; position: number }[] = [];
        target.row.forEach((cell, offset) => places.push({ cell, position: target.position + 1 + offset }));
        for (let column = places.length - 1; column >= 0; column -= 1) {
          const text = cells[column] ?? '';
          const spot = places[column];
          if (spot === undefined || text === (was[column] ?? '').trim()) continue;
          tr.replaceWith(spot.position + 1, spot.position + spot.cell.nodeSize - 1, paragraphOf(state.schema, text));
        }
      }
      return true;
    })
    .run();
}

const paragraphOf = (schema: Schema, text: string): Node =>
  schema.node('paragraph', null, text === '' ? [] : [schema.text(text)]);

const rowOf = (schema: Schema, cells: readonly string[]): Node =>
  schema.node(
    'tableRow',
    { role: 'body' },
    cells.map((text) => schema.node('tableCell', null, [paragraphOf(schema, text)])),
  );
