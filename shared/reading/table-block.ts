import { type DocNode, zoneAround } from '#shared/document/define-block.ts';
import type { FoundRow, FoundTable } from './find-tables.ts';
import { inlineOf } from './inline.ts';
import { tableKind } from './type-columns.ts';
import { type RowRole, typedTable } from './typed-table.ts';

/** A table block from a found table: its rows sorted into heading, section and body rows, and its columns typed. */
export function tableBlock(found: FoundTable, id: string): DocNode {
  const { roles, columns } = typedTable(found);
  return {
    type: 'table',
    attrs: { id, zone: found.zone, kind: tableKind(columns.map(({ meaning }) => meaning)), columns },
    content: found.rows.map((row, index) => rowNode(row, roles[index] ?? 'body')),
  };
}

function rowNode({ cells, zone }: FoundRow, role: RowRole): DocNode {
  const type = role === 'head' ? 'tableHeader' : 'tableCell';
  return {
    type: 'tableRow',
    attrs: { role, zone },
    content: cells.map((words) => ({
      type,
      attrs: {
        zone: words.length === 0 ? null : zoneAround(words.map(({ box }) => box)),
        colspan: 1,
        rowspan: 1,
        colwidth: null,
      },
      content: [{ type: 'paragraph', attrs: { id: null, zone: null }, content: inlineOf(words) }],
    })),
  };
}
