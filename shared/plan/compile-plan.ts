import type { CalcProblem } from '#shared/calc/problem.ts';
import { compile } from '#shared/calc/program.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import type { LookupTable } from '#shared/calc/tables.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import { defineStage, feedsOf, toleranceOf } from './define-stage.ts';
import type { FrequencyPlan, Stage } from './plan.ts';
import { beginSentence, inStageWords, nameStage, stageOfSymbol } from './stage-words.ts';

/** What is wrong with a plan whatever the setting. The message names the stage and the remedy. */
export type PlanProblem = {
  stage: string;
  code:
    | 'duplicate-id'
    | 'unknown-feed'
    | 'missing-feed'
    | 'too-many-feeds'
    | 'missing-parameter'
    | 'missing-unit'
    | 'bad-tolerance'
    | CalcProblem['code'];
  message: string;
};
export type CompiledPlan = {
  /** To be compiled together with the manual's own quantities. */
  definitions: QuantityDefinition[];
  problems: PlanProblem[];
};

/**
 * A plan as quantities: `plan_<id>` for each stage, `plan_<id>__<part>` for its parameters, limits and responses.
 * Never fails as a whole; the stages that can be computed are.
 */
export function compilePlan(
  plan: FrequencyPlan,
  quantities: readonly QuantityDefinition[],
  tables: readonly LookupTable[] = [],
): CompiledPlan {
  const definitions = planDefinitions(plan);
  const own = plan.stages.flatMap((stage) => objectionsTo(stage, plan));
  const told = new Set(own.map(({ stage }) => stage));
  const engine = compile([...quantities, ...definitions], tables).problems.flatMap((problem) => {
    const stage = stageOfSymbol(plan, problem.symbol);
    // The engine's word on a stage that has already been told what is missing would only repeat it.
    return stage === undefined || told.has(stage.id) ? [] : [inWordsOf(plan, stage, problem)];
  });
  return { definitions, problems: [...own, ...engine] };
}

type Sourced = Extract<Stage, { frequency: string }>;
/** The quantities of a plan alone, for whoever computes with them and does not ask what is wrong. */
export const planDefinitions = ({ stages }: FrequencyPlan): QuantityDefinition[] => stages.flatMap(defineStage);

type Objection = [code: PlanProblem['code'], says: string];

function objectionsTo(stage: Stage, plan: FrequencyPlan): PlanProblem[] {
  const objections = [...feedObjections(stage, plan), ...parameterObjections(stage)];
  if (plan.stages.filter(({ id }) => id === stage.id).length > 1)
    objections.push(['duplicate-id', `shares the id "${stage.id}" with another stage. Give one of them another id.`]);
  return objections.map(([code, says]) => ({
    stage: stage.id,
    code,
    message: `${beginSentence(nameStage(stage))} ${says}`,
  }));
}

function feedObjections({ kind, from }: Stage, { stages }: FrequencyPlan): Objection[] {
  const { least, names } = feedsOf[kind];
  const unknown = from.filter((id) => !stages.some((each) => each.id === id));
  const objections = unknown.map((id): Objection => [
    'unknown-feed',
    `is fed by "${id}", which is not in the plan. Connect it to a stage.`,
  ]);
  if (from.length < least)
    objections.push(['missing-feed', `has no ${names[from.length] ?? 'feed'}. Connect a stage to it.`]);
  if (from.length > names.length)
    objections.push([
      'too-many-feeds',
      `takes ${names.length === 0 ? 'no feed' : `only its ${names.join(' and ')}`}. Take the rest away.`,
    ]);
  return objections;
}

function parameterObjections(stage: Stage): Objection[] {
  const objections: Objection[] = [];
  const need = (text: string, word: string, example: string): void => {
    if (text.trim() === '') objections.push(['missing-parameter', `has no ${word}. Write one, like ${example}.`]);
  };
  if ('frequency' in stage) objections.push(...sourceObjections(stage));
  if (stage.kind === 'multiplier') need(stage.factor, 'factor', '9');
  if (stage.kind === 'divider') need(stage.divisor, 'divisor', '8');
  if ('n' in stage) {
    need(stage.n, 'count N', '1250 or 120 + 1/25');
    need(stage.r, 'reference divisor R', '1');
  }
  for (const edge of ['low', 'high'] as const)
    objections.push(...unitObjections(stage.limits?.[edge] ?? '', `${edge} limit`));
  return objections;
}

function sourceObjections({ frequency, printed = '', tolerance = '', ...stage }: Sourced): Objection[] {
  const objections = unitObjections(frequency, 'frequency');
  if (`${frequency}${printed}`.trim() === '')
    objections.push(['missing-parameter', 'has no frequency. Write one, like 16.2 MHz, or solve for it.']);
  if (tolerance.trim() !== '' && toleranceOf({ ...stage, frequency, tolerance }) === undefined)
    objections.push([
      'bad-tolerance',
      `has the tolerance "${tolerance}", which cannot be read. Write it like ±20 ppm, ±0.002 % or ±5 kHz.`,
    ]);
  return objections;
}

/** The engine would take a bare number to be in the quantity's own unit; in a plan that is a guess. */
function unitObjections(text: string, word: string): Objection[] {
  const parsed = parseQuantity(text);
  if (!parsed.ok || parsed.value.unit !== '' || parsed.value.range !== undefined) return [];
  return [['missing-unit', `has the ${word} ${text.trim()} without a unit. Write it, like ${text.trim()} MHz.`]];
}

const remedies: Partial<Record<CalcProblem['code'], string>> = {
  'unknown-symbol': 'Choose a quantity of this manual, or write a number with its unit.',
  'unit-mismatch': 'Frequencies need a unit like MHz; factors, divisors and counts are plain numbers.',
};

function inWordsOf(plan: FrequencyPlan, stage: Stage, problem: CalcProblem): PlanProblem {
  const { code } = problem;
  if (code === 'cycle') return ringProblem(plan, stage, problem);
  const says = inStageWords(plan, problem.message.replace(/ \(columns? [^)]*\)$/, '.').replace(/\.\.$/, '.'));
  const remedy = remedies[code];
  const message = `${beginSentence(nameStage(stage))}: ${says}${remedy === undefined ? '' : ` ${remedy}`}`;
  return { stage: stage.id, code, message };
}

function ringProblem(plan: FrequencyPlan, stage: Stage, { code, message }: CalcProblem): PlanProblem {
  const round = / in a ring: (.*?)\. Break/.exec(message)?.[1] ?? '';
  const names = inStageWords(plan, round).replaceAll(' needs ', ' is fed by ');
  return {
    stage: stage.id,
    code,
    message: `${beginSentence(nameStage(stage))} feeds itself: ${names}. Disconnect one of them.`,
  };
}
