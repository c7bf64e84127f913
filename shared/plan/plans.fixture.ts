import { builtInTables } from '#shared/calc/channel-plans.ts';
import { evaluate, type EvaluateOptions, type Evaluation, type InputValues } from '#shared/calc/evaluate.ts';
import { compile } from '#shared/calc/program.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { compilePlan } from './compile-plan.ts';
import { frequencyPlan, type FrequencyPlan } from './plan.ts';

type Draft = { id: string; kind: string; name?: string; from?: string[] } & Record<string, unknown>;

/** A plan from stages with only what matters written out. */
export const planOf = (...stages: Draft[]): FrequencyPlan =>
  frequencyPlan.parse({ stages: stages.map((stage) => ({ name: stage.id, from: [], ...stage })) });

/** Compiles and evaluates a plan beside a manual's quantities. */
export function run(
  plan: FrequencyPlan,
  {
    quantities = [],
    inputs = {},
    ...options
  }: EvaluateOptions & { quantities?: QuantityDefinition[]; inputs?: InputValues } = {},
): Evaluation {
  const { definitions } = compilePlan(plan, quantities, builtInTables);
  return evaluate(compile([...quantities, ...definitions], builtInTables), inputs, options);
}

/** A receiver with one conversion: carrier, crystal, multiplication, first IF. */
export const singleConversion = (parts: {
  carrier: string;
  crystal: string;
  factor: string;
  injection: 'high' | 'low';
}): FrequencyPlan =>
  planOf(
    { id: 'rf', kind: 'input', frequency: parts.carrier },
    { id: 'y1', kind: 'crystal', frequency: parts.crystal },
    { id: 'chain', kind: 'multiplier', from: ['y1'], factor: parts.factor },
    { id: 'mixer1', kind: 'mixer', from: ['rf', 'chain'], product: 'difference', injection: parts.injection },
  );

/** The invented HB-12: double conversion, a crystal of a ninth, low injection twice. */
export const harbourReceiver: FrequencyPlan = planOf(
  { id: 'rf', kind: 'input', name: 'Antenna', frequency: 'carrier' },
  { id: 'preselector', kind: 'filter', name: 'L1, L2', from: ['rf'], limits: { low: '155 mc', high: '158 mc' } },
  { id: 'y1', kind: 'crystal', name: 'Y1', frequency: '16.211111 mc', tolerance: '0.002 percent' },
  { id: 'tripler1', kind: 'multiplier', name: 'V4', from: ['y1'], factor: '3' },
  { id: 'tripler2', kind: 'multiplier', name: 'V5', from: ['tripler1'], factor: '3' },
  {
    id: 'mixer1',
    kind: 'mixer',
    name: 'V2',
    from: ['preselector', 'tripler2'],
    product: 'difference',
    injection: 'low',
  },
  {
    id: 'if1',
    kind: 'filter',
    name: 'T1, T2',
    from: ['mixer1'],
    limits: { low: 'first_if - 20 kc', high: 'first_if + 20 kc' },
  },
  { id: 'y2', kind: 'crystal', name: 'Y2', frequency: '10.245 mc' },
  { id: 'mixer2', kind: 'mixer', name: 'V6', from: ['if1', 'y2'], product: 'difference', injection: 'low', unit: 'kc' },
  {
    id: 'if2',
    kind: 'filter',
    name: 'T3, T4',
    from: ['mixer2'],
    unit: 'kc',
    limits: { low: '448 kc', high: '462 kc' },
  },
  { id: 'out', kind: 'output', name: 'Discriminator', from: ['if2'], unit: 'kc' },
);
export const harbourQuantities: QuantityDefinition[] = [
  { symbol: 'channel', label: 'Channel', kind: 'input', unit: '', home: 12, integer: true },
  { symbol: 'first_if', label: 'First IF', kind: 'constant', unit: 'mc', home: 10.7 },
  {
    symbol: 'carrier',
    label: 'Carrier',
    kind: 'derived',
    unit: 'mc',
    expression: 'lookup("maritime-vhf", channel, "ship")',
  },
];
