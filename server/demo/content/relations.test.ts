import { describe, expect, it } from 'vitest';
import { readPrintedNumber, type PrintedNumber } from '#shared/relations/printed-number.ts';
import { proposeRelations } from '#shared/relations/propose.ts';
import { quantitiesIn } from '#shared/search/quantities-in.ts';
import { hb12Quantities } from './hb-12-quantities.ts';
import { hb12 } from './hb-12.ts';
import { pageText } from './page-text.ts';
import type { Block, ManualPage } from './types.ts';

/** Every quantity that stands on a page, and every cell of a table whose heading names a unit. */
function numbersOn(page: ManualPage): PrintedNumber[] {
  const text = pageText({ ...page, blocks: page.blocks.filter((block) => !hasUnitColumns(block)) });
  const found = quantitiesIn(text).flatMap(({ start, end }, at) => {
    const printed = text.slice(start, end);
    const symbol = hb12Quantities.find((quantity) => quantity.printed.text === printed)?.symbol;
    const place = { id: `p${page.label.replace('-', '_')}_${at}`, page: page.label };
    return readPrintedNumber(printed, symbol === undefined ? place : { ...place, symbol }) ?? [];
  });
  return [...found, ...page.blocks.flatMap((block) => cellsOf(block, page.label))];
}

const unitIn = (heading: string): string => /\b(MC|KC)$/.exec(heading)?.[1] ?? '';
const hasUnitColumns = (block: Block): boolean =>
  block.kind === 'table' && block.columns.some(({ heading }) => unitIn(heading) !== '');

function cellsOf(block: Block, page: string): PrintedNumber[] {
  if (block.kind !== 'table' || !hasUnitColumns(block)) return [];
  return block.rows.flatMap((cells, row) =>
    cells.flatMap((cell, at) => {
      const heading = block.columns[at]?.heading ?? '';
      const column = { table: block.caption, title: block.caption, name: heading.replace(/ (MC|KC)$/, ''), row };
      return readPrintedNumber(`${cell} ${unitIn(heading)}`.trim(), { id: `r${row}_${at}`, page, column }) ?? [];
    }),
  );
}

describe('what the numbers of the HB-12 suggest', () => {
  const proposals = proposeRelations(hb12.pages.flatMap(numbersOn));
  const isLikely = ({ score }: { score: number }): boolean => score >= 1;

  it('the chain of its frequencies, from the table and from the text', () => {
    expect(proposals.filter(isLikely).map(({ target, expression }) => `${target} = ${expression}`)).toEqual([
      'column_crystal = column_injection / 9',
      'crystal = injection / 9',
      'column_injection = column_ship - firstIf',
      'injection = carrier - firstIf',
      'image = injection - firstIf',
      'injectionHigh = 2 * injection - injectionLow',
      'firstTripler = 3 * crystal',
    ]);
  });

  it('and, less sure, the second conversion and the channel above', () => {
    expect(proposals.filter((each) => !isLikely(each)).map(({ filled }) => filled)).toEqual([
      '10.245 mc = 10.700 mc - 455 kc',
      '9.790 mc = 10.245 mc - 455 kc',
      '156.625 mc = 156.600 mc + 25 kc',
    ]);
  });

  it('says how many rows of a table a formula holds for', () => {
    expect(proposals[0]).toMatchObject({
      says: 'In Table 5-1. Channels and crystals, CRYSTAL is INJECTION / 9 in all 24 rows.',
      table: { holds: 24, rows: 24, failing: [] },
    });
  });
});
