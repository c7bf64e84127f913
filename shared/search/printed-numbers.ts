import { proposeName } from '#shared/calc/propose-name.ts';
import type { TableColumn } from '#shared/document/blocks/table.ts';
import { unitIn } from '#shared/document/channel-tables.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import { cellTexts } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import { type PrintedNumber, readPrintedNumber } from '#shared/relations/printed-number.ts';
import { quantitiesIn } from './quantities-in.ts';

export type NumberedPage = { pageId: string; document: DocNode };

/**
 * Every number with a unit that the pages of a manual print, and every number of their tables, in the order of reading. A
 * live value comes with its quantity's symbol; the others get names n1, n2 and so on for formulas to use.
 */
export function printedNumbersOf(
  pages: readonly NumberedPage[],
  symbolOf: ReadonlyMap<string, string>,
): PrintedNumber[] {
  const numbers: PrintedNumber[] = [];
  const add = (text: string, place: Omit<Parameters<typeof readPrintedNumber>[1], 'id'>): void => {
    const number = readPrintedNumber(text, { ...place, id: `n${numbers.length + 1}` });
    if (number !== undefined) numbers.push(number);
  };
  const visit = (node: DocNode, page: string): void => {
    if (node.type === 'table') return visitTable(node, page);
    const inline = node.content?.some(({ type }) => type === 'text' || type === 'liveValue') ?? false;
    if (!inline) return node.content?.forEach((child) => visit(child, page));
    const { text, symbolAt } = flat(node, symbolOf);
    for (const { start, end } of quantitiesIn(text)) {
      const symbol = symbolAt(start, end);
      const { label } = proposeName(text.slice(0, start), []);
      add(text.slice(start, end), { page, label, ...(symbol === undefined ? {} : { symbol }) });
    }
  };
  const visitTable = (table: DocNode, page: string): void => {
    const columns = (table.attrs?.['columns'] ?? []) as TableColumn[];
    const rows = (table.content ?? []).filter(({ attrs }) => (attrs?.['role'] ?? 'body') === 'body');
    rows.forEach((row, at) => {
      const cells = cellTexts(row);
      // "First i-f | 10.700 mc": a row that begins with words says itself what its number is.
      const rowLabel = /[A-Za-z]{3}/.test(cells[0] ?? '') ? cells[0]?.trim() : undefined;
      cells.forEach((cell, index) => {
        const heading = columns[index]?.heading ?? `column ${index + 1}`;
        const unit = unitIn(heading);
        const text = cell.trim();
        const isBare = /^[-+]?[\d.,]+$/.test(text);
        const column = { table: `${page} ${String(table.attrs?.['id'])}`, name: heading, row: at + 1 };
        if (text !== '')
          add(isBare && unit !== '' ? `${text} ${unit}` : text, { page, label: rowLabel ?? heading, column });
      });
    });
  };
  for (const { pageId, document } of pages) visit(document, pageId);
  return numbers;
}

/** The text of a block, and which quantity a stretch of it is live with. */
function flat(node: DocNode, symbolOf: ReadonlyMap<string, string>) {
  const live: { start: number; end: number; symbol: string }[] = [];
  let text = '';
  for (const child of node.content ?? []) {
    const own = textOf(child);
    const symbol = child.type === 'liveValue' ? symbolOf.get(String(child.attrs?.['quantity'])) : undefined;
    if (symbol !== undefined) live.push({ start: text.length, end: text.length + own.length, symbol });
    text += own;
  }
  const symbolAt = (start: number, end: number): string | undefined =>
    live.find((each) => each.start < end && each.end > start)?.symbol;
  return { text, symbolAt };
}
