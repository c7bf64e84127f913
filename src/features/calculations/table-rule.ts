import type { LookupTable } from '#shared/calc/tables.ts';
import { type ChannelRule, findChannelRule } from '#shared/relations/channel-rule.ts';
import { toBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';

/** The rule that the frequencies of a table's column keep to; undefined where it holds none, or keeps to none. */
export function ruleOfColumn({ columns, rows }: LookupTable, column: number): ChannelRule | undefined {
  const unit = findUnit(columns[column]?.unit ?? '');
  if (!unit.ok || unit.value.dimension !== 'frequency') return undefined;
  const values = rows.map((row) => row[column + 1] ?? NaN);
  // The last digit that any row of the column prints.
  const decimals = Math.max(0, ...values.map((value) => String(value).split('.')[1]?.length ?? 0));
  const grain = toBase(`1e-${decimals}`, unit.value);
  return findChannelRule(
    rows.map((row, at) => ({ channel: row[0] ?? NaN, hz: toBase(values[at] ?? NaN, unit.value), grain })),
  );
}
