import { parse } from 'csv-parse/browser/esm/sync';
import type { ColumnMeaning, TableColumn } from '#shared/document/blocks/table.ts';
import { type Result, fail, succeed } from '#shared/kit/result.ts';
import { columnWords } from '#src/blocks/trade-words.ts';

/** Rows from outside: the first names the columns. */
export type Incoming = { headings: string[]; rows: string[][] };
/** What taking rows in does to one row of the table; `at` is its place among the table's body rows. */
export type RowChange =
  | { kind: 'changed'; at: number; cells: string[]; was: string[] }
  | { kind: 'same'; at: number; cells: string[] }
  | { kind: 'new'; cells: string[] };
export type ImportPlan = { changes: RowChange[]; /** Headings that no column of the table has. */ unused: string[] };

const mostRows = 5000;

/** Reads comma-, semicolon- or tab-separated text (RFC 4180), as files and spreadsheets give it. */
export function readRows(text: string): Result<Incoming, string> {
  const [firstLine = ''] = text.split(/\r?\n/, 1);
  const delimiter = ['\t', ';', ','].find((sign) => firstLine.includes(sign)) ?? ',';
  try {
    const all: string[][] = parse(text, {
      ...{ delimiter, bom: true, trim: true, skip_empty_lines: true, relax_column_count: true },
    });
    const [headings, ...rows] = all;
    if (headings === undefined || rows.length === 0)
      return fail('There is nothing to take in. The first line names the columns, each further line is a row.');
    if (rows.length > mostRows)
      return fail(`These are ${rows.length} rows. A table of a page takes up to ${mostRows}.`);
    return succeed({ headings, rows });
  } catch (error) {
    return fail(`This is no table that can be read: ${error instanceof Error ? error.message : ''}`);
  }
}

const plain = (words: string): string => words.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');

/** Which column of the incoming rows each column of the table takes: by its printed heading, or by what it means. */
export function columnsFor({ headings }: Incoming, columns: readonly TableColumn[]): (number | null)[] {
  return columns.map(({ heading, meaning }) => {
    const names = [heading, meaning, wordsOf(meaning)].map(plain).filter((name) => name !== '' && name !== 'other');
    const at = headings.findIndex((each) => names.includes(plain(each)));
    return at < 0 ? null : at;
  });
}
const wordsOf = (meaning: ColumnMeaning): string => columnWords[meaning];

/**
 * What taking the rows in would change. A row is known by its designators, or where the table has none by its part
 * number; an empty cell from outside leaves what stands there; rows of the table that are not named stay as they are.
 */
export function planImport(
  incoming: Incoming,
  { columns, rows }: { columns: readonly TableColumn[]; rows: readonly (readonly string[])[] },
): ImportPlan {
  const from = columnsFor(incoming, columns);
  const key = (['refDes', 'partNumber', 'item', 'channel'] as const)
    .map((meaning) => columns.findIndex((column) => column.meaning === meaning))
    .find((at) => at >= 0 && from[at] !== null);
  const known = new Map(rows.map((cells, at) => [key === undefined ? '' : plain(cells[key] ?? ''), at]));
  const changes = incoming.rows.map((row): RowChange => {
    const given = from.map((at) => (at === null ? '' : (row[at] ?? '')));
    const name = key === undefined ? '' : plain(given[key] ?? '');
    const at = name === '' ? undefined : known.get(name);
    const was = at === undefined ? undefined : rows[at];
    if (at === undefined || was === undefined) return { kind: 'new', cells: given };
    const cells = given.map((cell, column) => (cell === '' ? (was[column] ?? '') : cell));
    const isSame = cells.every((cell, column) => cell === (was[column] ?? '').trim());
    return isSame ? { kind: 'same', at, cells } : { kind: 'changed', at, cells, was: [...was] };
  });
  return { changes, unused: incoming.headings.filter((_, at) => !from.includes(at)) };
}
