import { convert } from '#shared/units/convert.ts';
import { roundToDecimals } from '#shared/units/format-quantity.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { ParsedQuantity } from '#shared/units/parsed-quantity.ts';
import type { LiveValue } from './describe-value.ts';
import { evaluate } from './evaluate.ts';
import type { CalcProblem } from './problem.ts';
import type { Program } from './program.ts';

/** One printed value held against the computed one. `computed` is '' where there is none; `problem` then says why. */
export type ProofItem = { symbol: string; printed: string; computed: string; agrees: boolean; problem?: CalcProblem };
export type Proof = { holds: boolean; items: ProofItem[] };

/** Evaluates at the home setting: every printed value must come out again, to the digits printed. */
export function proof(program: Program): Proof {
  const { values } = evaluate(program);
  const items = Object.entries(values).flatMap(([symbol, value]) =>
    value.printed === undefined ? [] : [proveOne(symbol, value, value.printed)],
  );
  return { holds: items.every(({ agrees }) => agrees), items };
}

function proveOne(symbol: string, live: LiveValue, printed: string): ProofItem {
  const item = { symbol, printed, computed: live.text };
  if (live.value === null)
    return { ...item, agrees: false, ...(live.problem === undefined ? {} : { problem: live.problem }) };
  const parsed = parseQuantity(printed);
  if (!parsed.ok)
    return {
      ...item,
      agrees: false,
      problem: { code: 'not-a-quantity', symbol, message: `What is printed cannot be read: ${parsed.error.message}` },
    };
  const inPrinted =
    parsed.value.unit === ''
      ? { ok: true as const, value: live.value }
      : convert(live.value, live.unit, parsed.value.unit);
  if (!inPrinted.ok)
    return { ...item, agrees: false, problem: { code: 'unit-mismatch', symbol, message: inPrinted.error.message } };
  return { ...item, agrees: agreesWith(inPrinted.value, parsed.value) };
}

/** To the digits printed, rounded half away from zero; a printed range is met by any value inside. */
function agreesWith(value: number, { range, decimals, magnitude }: ParsedQuantity): boolean {
  const rounded = roundToDecimals(value, decimals);
  if (range !== undefined) return rounded >= range.low && rounded <= range.high;
  return rounded === roundToDecimals(magnitude, decimals);
}
