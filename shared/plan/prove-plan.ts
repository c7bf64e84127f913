import { evaluate } from '#shared/calc/evaluate.ts';
import { compile } from '#shared/calc/program.ts';
import { proof } from '#shared/calc/proof.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import type { LookupTable } from '#shared/calc/tables.ts';
import { convert } from '#shared/units/convert.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import { compilePlan } from './compile-plan.ts';
import { unitOf } from './define-stage.ts';
import type { FrequencyPlan, Stage } from './plan.ts';
import { beginSentence, nameStage, symbolOfStage } from './stage-words.ts';

/** A stage's printed frequency held against the plan at the home setting. */
export type StageProof = {
  stage: string;
  printed: string;
  /** As the manual would print it; '' where the plan gives no value. */
  computed: string;
  agrees: boolean;
  /** Whether it follows from what is printed for the stages before it; null where nothing is printed there, or it cannot be told. */
  followsFromFeeds: boolean | null;
  says: string;
};

/**
 * Every stage with a printed value, in the plan's order. One that disagrees though it follows from what is printed before
 * it only passes on an earlier disagreement; one that does not follow is where to look.
 */
export function provePlan(
  plan: FrequencyPlan,
  quantities: readonly QuantityDefinition[],
  tables: readonly LookupTable[] = [],
): StageProof[] {
  const { definitions } = compilePlan(plan, quantities, tables);
  const items = proof(compile([...quantities, ...definitions], tables)).items;
  return plan.stages.flatMap((stage) => {
    const item = items.find(({ symbol }) => symbol === symbolOfStage(stage.id));
    if (item === undefined) return [];
    const follows = followsFromFeeds(stage, { plan, definitions: [...quantities, ...definitions], tables });
    const { printed, computed, agrees, problem } = item;
    const why = agrees ? 'agrees.' : (problem?.message ?? disagreement(computed, follows));
    const says = `${beginSentence(nameStage(stage))}: ${printed.trim()} as printed ${agrees ? why : `disagrees: ${why}`}`;
    return [{ stage: stage.id, printed, computed, agrees, followsFromFeeds: follows, says }];
  });
}

function disagreement(computed: string, follows: boolean | null): string {
  const plan = `the plan gives ${computed}.`;
  if (follows === true) return `${plan} It follows from what is printed before it, so look there.`;
  if (follows === false)
    return `${plan} It does not follow from what is printed before it: look at this stage and its print.`;
  return `${plan} Nothing is printed before it to hold it against.`;
}

type Context = { plan: FrequencyPlan; definitions: readonly QuantityDefinition[]; tables: readonly LookupTable[] };

/** The stage computed anew from printed values: every other printed stage is set to its print, give or take half a digit. */
function followsFromFeeds(stage: Stage, { plan, definitions, tables }: Context): boolean | null {
  const before = printedBefore(stage, plan);
  const own = spanOf(stage);
  if (before.length === 0 || own === undefined) return null;
  const prints = new Map(
    before.flatMap((each) => (spanOf(each) === undefined ? [] : [[symbolOfStage(each.id), each]])),
  );
  const asPrinted = definitions.map((definition) => {
    const print = prints.get(definition.symbol);
    return print === undefined ? definition : constantOf(definition, print);
  });
  const live = evaluate(compile(asPrinted, tables), {}, { tolerances: true }).values[symbolOfStage(stage.id)];
  if (live === undefined || live.value === null) return null;
  const { low = live.value, high = live.value } = live;
  // A double's last digits must not decide a tie at half a digit.
  const slack = own.half + Math.abs(live.value) * 1e-12;
  return own.value >= low - slack && own.value <= high + slack;
}

/** The nearest printed stages behind each feed. */
function printedBefore(stage: Stage, plan: FrequencyPlan, seen = new Set<string>()): Stage[] {
  return stage.from.flatMap((id) => {
    const feed = plan.stages.find((each) => each.id === id);
    if (feed === undefined || seen.has(id)) return [];
    seen.add(id);
    return spanOf(feed) === undefined ? printedBefore(feed, plan, seen) : [feed];
  });
}

/** The printed value and half its last digit, in the stage's unit. */
function spanOf(stage: Stage): { value: number; half: number } | undefined {
  const parsed = parseQuantity(stage.printed ?? '');
  if (!parsed.ok || parsed.value.range !== undefined) return undefined;
  const value = convert(parsed.value.magnitude, parsed.value.unit, unitOf(stage));
  const half = convert(0.5 * 10 ** -parsed.value.decimals, parsed.value.unit, unitOf(stage));
  return value.ok && half.ok ? { value: value.value, half: half.value } : undefined;
}

function constantOf({ symbol, label, unit }: QuantityDefinition, print: Stage): QuantityDefinition {
  const { value, half } = spanOf(print) ?? { value: NaN, half: 0 };
  return {
    symbol,
    label,
    unit,
    kind: 'constant',
    home: value,
    tolerance: { kind: 'absolute', plus: half, minus: half },
  };
}
