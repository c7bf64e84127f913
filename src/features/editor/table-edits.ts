import type { ChainedCommands, Editor } from '@tiptap/core';
import type { Node } from '@tiptap/pm/model';
import { selectedRect, TableMap } from '@tiptap/pm/tables';
import type { ColumnMeaning, TableColumn } from '#shared/document/blocks/table.ts';
import type { rowRoles } from '#shared/document/blocks/table-row.ts';

export type RowRole = (typeof rowRoles)[number];
/** Where the caret is in a table: the table, its columns made as many as it is wide, the row and the column. */
export type TablePlace = {
  table: Node;
  position: number;
  columns: TableColumn[];
  row: number;
  column: number;
  role: RowRole;
};

export function tablePlace(editor: Editor): TablePlace | null {
  if (!editor.isActive('table')) return null;
  const { table, tableStart, top, left, map } = selectedRect(editor.state);
  return {
    table,
    position: tableStart - 1,
    columns: columnsOf(table, map.width),
    row: top,
    column: left,
    role: (table.maybeChild(top)?.attrs['role'] as RowRole | undefined) ?? 'body',
  };
}

/** What the columns are called and mean; a column that is not described yet takes its heading from the heading rows. */
function columnsOf(table: Node, width: number): TableColumn[] {
  const described = table.attrs['columns'] as readonly TableColumn[];
  return Array.from({ length: width }, (_, at) => described[at] ?? { heading: headingOf(table, at), meaning: 'other' });
}

function headingOf(table: Node, column: number): string {
  const words: string[] = [];
  table.forEach((row) => {
    if (row.attrs['role'] === 'head') words.push(row.maybeChild(column)?.textContent ?? '');
  });
  return words.join(' ').trim();
}

const withColumns = (chain: ChainedCommands, { position }: TablePlace, columns: readonly TableColumn[]): boolean =>
  chain
    .command(({ tr }) => {
      tr.setNodeAttribute(position, 'columns', columns);
      return true;
    })
    .run();

export function addColumn(editor: Editor, side: 'before' | 'after'): boolean {
  const place = tablePlace(editor);
  if (place === null) return false;
  const chain = editor.chain().focus();
  const columns = place.columns.toSpliced(place.column + (side === 'after' ? 1 : 0), 0, {
    heading: '',
    meaning: 'other',
  });
  return withColumns(side === 'after' ? chain.addColumnAfter() : chain.addColumnBefore(), place, columns);
}

export function deleteColumn(editor: Editor): boolean {
  const place = tablePlace(editor);
  if (place === null) return false;
  if (place.columns.length === 1) return editor.chain().focus().deleteTable().run();
  return withColumns(editor.chain().focus().deleteColumn(), place, place.columns.toSpliced(place.column, 1));
}

export function setMeaning(editor: Editor, column: number, meaning: ColumnMeaning): boolean {
  const place = tablePlace(editor);
  if (place === null) return false;
  return withColumns(
    editor.chain(),
    place,
    place.columns.map((each, at) => (at === column ? { ...each, meaning } : each)),
  );
}

export const setTableKind = (editor: Editor, kind: string): boolean =>
  editor.chain().updateAttributes('table', { kind }).run();

/** Gives the row its part; cells of a heading row are heading cells, and no others are. */
export function setRowRole(editor: Editor, role: RowRole): boolean {
  const place = tablePlace(editor);
  const row = place?.table.maybeChild(place.row);
  if (place === null || row === null || row === undefined) return false;
  const { table, position } = place;
  return editor
    .chain()
    .command(({ tr, state }) => {
      const map = TableMap.get(table);
      let rowPosition = position + 1;
      for (let at = 0; at < place.row; at += 1) rowPosition += table.child(at).nodeSize;
      const type = state.schema.nodes[role === 'head' ? 'tableHeader' : 'tableCell'];
      if (type === undefined || map.height <= place.row) return false;
      row.forEach((cell, offset) => {
        tr.setNodeMarkup(rowPosition + 1 + offset, type, cell.attrs);
      });
      tr.setNodeAttribute(rowPosition, 'role', role);
      return true;
    })
    .run();
}
