import type { LookupTable } from '#shared/calc/tables.ts';
import { findUnit } from '#shared/units/definitions.ts';
import type { TableColumn } from './blocks/table.ts';
import type { DocNode } from './define-block.ts';
import { type PageTable, tablesOf } from './tables.ts';
import { textOf } from './text-of.ts';

/** A channel table of a page for formulas to look into, and what of it could not be taken. */
export type ChannelTable = LookupTable & { left: string[] };

/** So many of a column's filled cells are numbers, or it is no column of numbers. */
const leastNumbers = 0.8;

/**
 * The channel tables of a page: those that are tagged so. The key is the channel column, or else the first; every other column of numbers can
 * be looked up under its heading in small letters. The name is that of the caption ("table-5-2"), else the page's.
 */
export function channelTablesOf(document: DocNode, pageLabel: string): ChannelTable[] {
  const captions = captionsOf(document);
  return tablesOf(document)
    .filter(({ kind }) => kind === 'channel')
    .flatMap((table, index) => {
      const caption = captions.get(table.id);
      const numbered = /\btable\s+([\w.-]*\d)/i.exec(caption ?? '')?.[1];
      const id = slug(numbered === undefined ? `page ${pageLabel} ${index + 1}` : `table ${numbered}`);
      return lookupFrom(table, { id, title: caption ?? `Channel table on page ${pageLabel}`, pageLabel }) ?? [];
    });
}

/** The caption that stands right before or behind each table. */
function captionsOf({ content = [] }: DocNode): Map<string, string> {
  const captions = new Map<string, string>();
  content.forEach((node, at) => {
    if (node.type !== 'table') return;
    const near = [content[at - 1], content[at + 1]].find((each) => each?.type === 'caption');
    if (near !== undefined) captions.set(String(node.attrs?.['id']), textOf(near).trim());
  });
  return captions;
}

type Naming = { id: string; title: string; pageLabel: string };

function lookupFrom({ columns, rows }: PageTable, { id, title, pageLabel }: Naming): ChannelTable | null {
  const channel = columns.findIndex(({ meaning }) => meaning === 'channel');
  const key = Math.max(0, channel);
  const numeric = columns.flatMap((column, at) => (at !== key && isNumeric(rows, at) ? [{ column, at }] : []));
  const names = distinctNames(numeric.map(({ column }) => column));
  const left: string[] = [];
  const seen = new Set<number>();
  const taken = rows.flatMap((cells) => {
    const [first = NaN, ...rest] = [key, ...numeric.map(({ at }) => at)].map((at) => numberIn(cells[at]));
    const why = reasonToLeave(first, rest, seen);
    if (why === null) return seen.add(first) && [[first, ...rest]];
    if (cells.some((cell) => cell.trim() !== '')) left.push(`${cells[key] || 'a row'}: ${why}`);
    return [];
  });
  if (taken.length === 0 || numeric.length === 0) return null;
  return {
    id,
    title,
    source: `page ${pageLabel} of this manual`,
    key: { name: 'channel', unit: unitIn(columns[key]?.heading ?? '') },
    columns: numeric.map(({ column }, at) => ({ name: names[at] ?? '', unit: unitIn(column.heading) })),
    rows: taken,
    left,
  };
}

function reasonToLeave(key: number, rest: readonly number[], seen: ReadonlySet<number>): string | null {
  if (Number.isNaN(key)) return 'no number for a key';
  if (seen.has(key)) return 'stands in the table twice';
  return rest.some(Number.isNaN) ? 'a cell holds no number' : null;
}

function isNumeric(rows: readonly string[][], at: number): boolean {
  const filled = rows.filter((cells) => (cells[at] ?? '').trim() !== '');
  return (
    filled.filter((cells) => !Number.isNaN(numberIn(cells[at]))).length >= Math.max(1, filled.length * leastNumbers)
  );
}

/** `156.600`, `1,250.5`: a cell that is a number and nothing else; NaN otherwise. */
function numberIn(cell = ''): number {
  const text = cell.trim().replace(/,(?=\d{3}\b)/g, '');
  return /^[-+]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : NaN;
}

/** The unit in a heading: "FREQUENCY (MC)", "CRYSTAL MC". '' where there is none. */
export function unitIn(heading: string): string {
  const bracketed = /[([]\s*([^)\]]+?)\s*[)\]]/.exec(heading)?.[1];
  const last = heading.trim().split(/\s+/).at(-1) ?? '';
  const found = [bracketed, last].find((text) => text !== undefined && text !== '' && isUnit(text));
  return found === undefined
    ? ''
    : found.toLowerCase() === found || !isUnit(found.toLowerCase())
      ? found
      : found.toLowerCase();
}

const isUnit = (text: string): boolean => findUnit(text).ok && !/^\d/.test(text);

const slug = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');

function distinctNames(columns: readonly TableColumn[]): string[] {
  const names: string[] = [];
  for (const { heading } of columns) {
    const bare = slug(heading.replace(/[([].*?[)\]]/g, ' ')) || 'value';
    const same = names.filter((name) => name === bare || name.startsWith(`${bare}-`)).length;
    names.push(same === 0 ? bare : `${bare}-${same + 1}`);
  }
  return names;
}
