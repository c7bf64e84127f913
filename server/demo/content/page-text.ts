import type { Block, ManualPage } from './types.ts';

/** What the page says, block by block, one line each; lettering inside a drawing is left out. */
export function pageText(page: ManualPage): string {
  return page.blocks.map(blockText).join('\n');
}

function blockText(block: Block): string {
  switch (block.kind) {
    case 'step':
      return `${block.marker} ${block.text}`;
    case 'warning':
    case 'caution':
    case 'note':
      return `${block.kind.toUpperCase()}\n${block.text}`;
    case 'parts-table':
      return tableText(
        block,
        block.rows.map((row) => row.cells),
      );
    case 'table':
      return tableText(block, block.rows);
    case 'figure':
      return block.caption;
    default:
      return block.text;
  }
}

function tableText(
  block: { readonly caption: string; readonly columns: readonly { readonly heading: string }[] },
  rows: readonly (readonly string[])[],
): string {
  const headings = block.columns.map((column) => column.heading);
  return [block.caption, ...[headings, ...rows].map((cells) => cells.join(' '))].join('\n');
}
