import type { FrequencyPlan, Stage, StageKind } from './plan.ts';

/** The quantity that holds a stage's frequency. No unit, function or word of formulas begins with `plan_`. */
export const symbolOfStage = (id: string): string => `plan_${id}`;
/** A quantity that belongs to a stage: a parameter, a limit, or what follows from it. */
export const symbolOfPart = (id: string, part: StagePart): string => `plan_${id}__${part}`;

export type StagePart = keyof typeof partWords;
const partWords = {
  factor: 'factor',
  divisor: 'divisor',
  n: 'count N',
  r: 'reference divisor R',
  low: 'low limit',
  high: 'high limit',
  image: 'image frequency',
  half_if: 'half-IF response',
  feed: 'feed',
  mix: 'offset mix',
} as const;
export const wordOfPart = (part: StagePart): string => partWords[part];

const kindWords: Readonly<Record<StageKind, string>> = {
  input: 'input',
  crystal: 'crystal',
  vcxo: 'variable crystal oscillator',
  synthesiser: 'synthesiser',
  multiplier: 'multiplier',
  divider: 'divider',
  mixer: 'mixer',
  filter: 'filter',
  loop: 'loop',
  output: 'output',
};

/** `mixer "First mixer"`; the id where a stage has no name yet. */
export const nameStage = ({ kind, name, id }: Stage): string =>
  `${kindWords[kind]} "${name.trim() === '' ? id : name.trim()}"`;
export const beginSentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const symbolPattern = /\bplan_([A-Za-z0-9]+(?:_[A-Za-z0-9]+)*)(?:__([a-z_]+))?\b/g;

/** Puts the names of stages where a message of the engine has their symbols. */
export function inStageWords(plan: FrequencyPlan, message: string): string {
  return message.replace(symbolPattern, (symbol, id: string, part: string | undefined) => {
    const stage = plan.stages.find((each) => each.id === id);
    if (stage === undefined) return symbol;
    return part === undefined || !(part in partWords)
      ? nameStage(stage)
      : `the ${wordOfPart(part as StagePart)} of ${nameStage(stage)}`;
  });
}

/** The stage that a symbol belongs to. */
export function stageOfSymbol(plan: FrequencyPlan, symbol: string): Stage | undefined {
  const id = /^plan_(.+?)(?:__[a-z_]+)?$/.exec(symbol)?.[1];
  return plan.stages.find((each) => each.id === id);
}
