import { describe, expect, it } from 'vitest';
import type { TableColumn } from '#shared/document/blocks/table.ts';
import { type Incoming, planImport, readRows } from './table-import.ts';

const columns: TableColumn[] = [
  { heading: 'REF. DES.', meaning: 'refDes' },
  { heading: 'DESCRIPTION', meaning: 'description' },
  { heading: 'PART NO.', meaning: 'partNumber' },
];
const rows = [
  ['C1', 'Mica, silvered', '22-1470'],
  ['R1', 'Carbon', '41-5470'],
];

function read(text: string): Incoming {
  const result = readRows(text);
  if (!result.ok) throw new Error(result.error);
  return result.value;
}

describe('rows from a spreadsheet', () => {
  it.each([
    ['commas', 'Ref des,Description\nC1,"Mica, 47"'],
    ['semicolons', 'Ref des;Description\nC1;Mica, 47'],
    ['tabs', 'Ref des\tDescription\r\nC1\tMica, 47\r\n'],
    ['a byte order mark', '\ufeffRef des,Description\nC1,"Mica, 47"'],
  ])('are read with %s', (_, text) =>
    expect(read(text)).toEqual({ headings: ['Ref des', 'Description'], rows: [['C1', 'Mica, 47']] }),
  );

  it('are refused in words where there are none', () => {
    expect(readRows('')).toMatchObject({ ok: false });
    expect(readRows('Ref des,Description')).toMatchObject({ ok: false });
    expect(readRows('a,b\n"never closed')).toMatchObject({ ok: false });
  });

  it('change the rows that they name, add the others, and leave the rest', () => {
    const plan = planImport(read('partNumber,refDes,Colour\n22-1471,c1,red\n41-5470,R1,\n50-1,D7,'), { columns, rows });
    expect(plan).toEqual({
      changes: [
        { kind: 'changed', at: 0, cells: ['c1', 'Mica, silvered', '22-1471'], was: rows[0] },
        { kind: 'same', at: 1, cells: ['R1', 'Carbon', '41-5470'] },
        { kind: 'new', cells: ['D7', '', '50-1'] },
      ],
      unused: ['Colour'],
    });
  });

  it('are all new where nothing tells which row is which', () => {
    const plan = planImport(read('Description\nSpacer'), { columns, rows });
    expect(plan.changes).toEqual([{ kind: 'new', cells: ['', 'Spacer', ''] }]);
  });
});
