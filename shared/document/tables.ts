import type { TableColumn } from './blocks/table.ts';
import type { DocNode } from './define-block.ts';
import { allNodes, textOf } from './text-of.ts';

export type PageTable = {
  id: string;
  kind: 'parts' | 'channel' | 'table';
  columns: TableColumn[];
  rows: string[][];
};

/** The tables of a page as plain text cells. Heading rows and section headings are not rows. */
export function tablesOf(document: DocNode): PageTable[] {
  return [...allNodes(document)]
    .filter(({ type }) => type === 'table')
    .map((table, index) => ({
      id: (table.attrs?.['id'] as string | null | undefined) ?? `table-${index + 1}`,
      kind: (table.attrs?.['kind'] as PageTable['kind'] | undefined) ?? 'table',
      columns: (table.attrs?.['columns'] as TableColumn[] | undefined) ?? [],
      rows: (table.content ?? []).filter(({ attrs }) => (attrs?.['role'] ?? 'body') === 'body').map(cellTexts),
    }));
}

/** The text of each cell of a row; a cell that spans columns is followed by empty ones, so columns keep their place. */
export const cellTexts = (row: DocNode): string[] =>
  (row.content ?? []).flatMap((cell) => {
    const span = Number(cell.attrs?.['colspan'] ?? 1);
    return [textOf(cell), ...Array.from({ length: span - 1 }, () => '')];
  });
