import type { LiveValue } from './describe-value.ts';
import { type InputValues, evaluate } from './evaluate.ts';
import type { Program } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';

/** A place on a page where a quantity stands in for a printed number. */
export type Occurrence = { pageId: string; pageLabel: string; symbol: string; printed: string };

export type ChangeRow = {
  /** Null for a quantity that stands on no page. */
  pageId: string | null;
  pageLabel: string | null;
  symbol: string;
  label: string;
  printed: string | null;
  /** As the paper would print it; '' where there is no value, and then `problem` says why. */
  before: string;
  after: string;
  /** Its limits hold no more at the second setting; or they did not at the first, and do now. */
  limits: 'leaves' | 'returns' | 'stays outside' | null;
  problem: string | null;
};

export type ChangeSheet = { rows: ChangeRow[]; same: number; leaving: number; unavailable: number };

/**
 * Every value that differs between two settings, page by page in the order of the pages, and at the end those that stand on
 * no page. A value that breaks its limits at the second setting is listed even if it prints the same.
 */
export function changeSheet(
  program: Program,
  occurrences: readonly Occurrence[],
  { before, after }: { before: InputValues; after: InputValues },
): ChangeSheet {
  const [then, now] = [evaluate(program, before).values, evaluate(program, after).values];
  const definitions = new Map(program.cells.map(({ definition }) => [definition.symbol, definition]));
  const rows: ChangeRow[] = [];
  let same = 0;
  for (const place of [...distinct(occurrences), ...offPages(definitions, occurrences)]) {
    const [was, is, definition] = [then[place.symbol], now[place.symbol], definitions.get(place.symbol)];
    if (was === undefined || is === undefined || definition === undefined) continue;
    const row = rowOf(place, definition, { was, is });
    if (row.before === row.after && row.limits === null) same += 1;
    else rows.push(row);
  }
  const count = (holds: (row: ChangeRow) => boolean): number => rows.filter(holds).length;
  return {
    rows,
    same,
    leaving: count(({ limits }) => limits === 'leaves' || limits === 'stays outside'),
    unavailable: count(({ after: text }) => text === ''),
  };
}

type Place = Pick<ChangeRow, 'pageId' | 'pageLabel' | 'symbol' | 'printed'>;

/** The same number printed twice on a page is one row. */
function distinct(occurrences: readonly Occurrence[]): Place[] {
  const seen = new Map(occurrences.map((each) => [`${each.pageId} ${each.symbol} ${each.printed}`, each]));
  return [...seen.values()];
}

function offPages(definitions: ReadonlyMap<string, QuantityDefinition>, occurrences: readonly Occurrence[]): Place[] {
  const onPages = new Set(occurrences.map(({ symbol }) => symbol));
  return [...definitions.values()]
    .filter(({ symbol }) => !onPages.has(symbol))
    .map(({ symbol, printed }) => ({ pageId: null, pageLabel: null, symbol, printed: printed?.text ?? null }));
}

function rowOf(place: Place, { label }: QuantityDefinition, { was, is }: { was: LiveValue; is: LiveValue }): ChangeRow {
  return {
    ...place,
    label,
    before: was.text,
    after: is.text,
    limits: limitsBetween(was.limitsBroken === true, is.limitsBroken === true),
    problem: is.problem?.message ?? null,
  };
}

function limitsBetween(wasOutside: boolean, isOutside: boolean): ChangeRow['limits'] {
  if (isOutside) return wasOutside ? 'stays outside' : 'leaves';
  return wasOutside ? 'returns' : null;
}
