import { describe, expect, it } from 'vitest';
import { block, paragraph, text } from '#shared/document/documents.fixture.ts';
import { compareTables } from './compare-tables.ts';

const table = (...rows: string[][]) =>
  block(
    'table',
    { id: 't' },
    ...rows.map((cells) =>
      block(
        'tableRow',
        {},
        ...cells.map((each) => block('tableCell', {}, paragraph(...(each === '' ? [] : [text(each)])))),
      ),
    ),
  );

describe('two states of a table', () => {
  it('are held against each other cell by cell', () => {
    const [row] = compareTables(table(['R2', '100K', '1']), table(['R2', '120K', '1']));
    expect(row).toMatchObject({ change: 'changed', older: 0, newer: 0 });
    expect(row?.cells.map((pieces) => pieces.map(({ kind }) => kind).join())).toEqual(['same', 'gone,new', 'same']);
  });

  it('keep rows beside each other when others come and go', () => {
    const older = table(['R1', '470'], ['R2', '100K'], ['R3', '1K']);
    const newer = table(['R0', '10'], ['R1', '470'], ['R2', '120K'], ['R2A', '22'], ['R3', '1K']);
    expect(compareTables(older, newer).map(({ change, older: was, newer: is }) => [change, was, is])).toEqual([
      ['new', null, 0],
      ['same', 0, 1],
      ['changed', 1, 2],
      ['new', null, 3],
      ['same', 2, 4],
    ]);
  });

  it('say which rows are gone, and compare cells that one of them lacks with nothing', () => {
    const rows = compareTables(table(['R1', '470'], ['R2', '']), table(['R1', '470', 'spare']));
    expect(rows.map(({ change }) => change)).toEqual(['changed', 'gone']);
    expect(rows[0]?.cells[2]).toEqual([{ kind: 'new', text: 'spare' }]);
  });
});
