import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { convert } from '#shared/units/convert.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import { readTolerance } from '#shared/units/parse-tolerance.ts';
import type { Stage, StageKind, StageOf } from './plan.ts';
import { symbolOfPart, symbolOfStage, type StagePart } from './stage-words.ts';

/** How many stages may feed one of each kind, and what they are called. The first one is always the signal. */
export const feedsOf: Readonly<Record<StageKind, { least: number; names: readonly string[] }>> = {
  input: { least: 0, names: [] },
  crystal: { least: 0, names: [] },
  vcxo: { least: 0, names: [] },
  synthesiser: { least: 1, names: ['reference'] },
  multiplier: { least: 1, names: ['signal'] },
  divider: { least: 1, names: ['signal'] },
  mixer: { least: 2, names: ['signal', 'injection'] },
  filter: { least: 1, names: ['signal'] },
  loop: { least: 1, names: ['reference', 'offset mix'] },
  output: { least: 1, names: ['signal'] },
};

/** What a stage shows its frequency in where it does not say. */
export const usualUnit = 'MHz';
export const unitOf = (stage: Stage): string => stage.unit ?? usualUnit;

/** The stage's frequency, and after it the quantities that belong to the stage. */
export function defineStage(stage: Stage): QuantityDefinition[] {
  return [defineFrequency(stage), ...defineParameters(stage), ...defineLimits(stage), ...defineResponses(stage)];
}

const hasFrequency = (stage: Stage): stage is StageOf<'input' | 'crystal' | 'vcxo'> => 'frequency' in stage;

function defineFrequency(stage: Stage): QuantityDefinition {
  const printed = (stage.printed ?? '').trim() === '' ? {} : { printed: { text: stage.printed ?? '' } };
  const bare = {
    symbol: symbolOfStage(stage.id),
    label: stage.name,
    unit: unitOf(stage),
    ...printed,
    ...numericLimits(stage),
  };
  if (!hasFrequency(stage)) return { ...bare, kind: 'derived', expression: expressionOf(stage) };
  const spread = toleranceOf(stage);
  const text = stage.frequency.trim();
  // An empty one is an input without a value: it can still be solved for.
  const outcome: Partial<QuantityDefinition> & Pick<QuantityDefinition, 'kind'> =
    text === ''
      ? { kind: 'input' }
      : isLiteral(text)
        ? { kind: 'input', home: text }
        : { kind: 'derived', expression: text };
  const { limits, ...rest } = bare;
  // A solution beyond a tuning range is shown and reported; limits on an input would only hide it.
  const kept = outcome.kind === 'input' || limits === undefined ? rest : { ...rest, limits };
  return { ...kept, ...outcome, ...(spread === undefined ? {} : { tolerance: spread }) };
}

export function isLiteral(text: string): boolean {
  const parsed = parseQuantity(text);
  return parsed.ok && parsed.value.range === undefined;
}

function expressionOf(stage: Stage): string {
  const [first = symbolOfPart(stage.id, 'feed'), second] = stage.from.map(symbolOfStage);
  const part = (name: StagePart): string => symbolOfPart(stage.id, name);
  switch (stage.kind) {
    case 'multiplier':
      return `${first} * ${part('factor')}`;
    case 'divider':
      return `${first} / ${part('divisor')}`;
    case 'synthesiser':
      return `${first} * ${part('n')} / ${part('r')}`;
    case 'loop': {
      const locked = `${first} * ${part('n')} / ${part('r')}`;
      return second === undefined ? locked : `${second} ${stage.side === 'above' ? '+' : '-'} ${locked}`;
    }
    case 'mixer': {
      const injection = second ?? part('mix');
      if (stage.product === 'sum') return `${first} + ${injection}`;
      return stage.injection === 'low' ? `${first} - ${injection}` : `${injection} - ${first}`;
    }
    default:
      return first;
  }
}

/** Counts to solve for are inputs; what is wired in is constant; a formula is derived. */
function defineParameters(stage: Stage): QuantityDefinition[] {
  const define = (part: StagePart, text: string, kind: 'input' | 'constant'): QuantityDefinition => {
    const bare = { symbol: symbolOfPart(stage.id, part), label: `${stage.name}, ${part}`, unit: '' };
    if (!isLiteral(text)) return { ...bare, kind: 'derived', expression: text };
    return { ...bare, kind, home: text, ...(/^\s*\d+\s*$/.test(text) ? { integer: true } : {}) };
  };
  switch (stage.kind) {
    case 'multiplier':
      return [define('factor', stage.factor, 'constant')];
    case 'divider':
      return [define('divisor', stage.divisor, 'constant')];
    case 'synthesiser':
    case 'loop':
      return [define('n', stage.n, 'input'), define('r', stage.r, 'constant')];
    default:
      return [];
  }
}

function defineLimits(stage: Stage): QuantityDefinition[] {
  const define = (part: 'low' | 'high', text: string | undefined): QuantityDefinition[] => {
    if (text === undefined || text.trim() === '') return [];
    const bare = { symbol: symbolOfPart(stage.id, part), label: `${stage.name}, ${part}`, unit: unitOf(stage) };
    return [
      isLiteral(text) ? { ...bare, kind: 'constant', home: text } : { ...bare, kind: 'derived', expression: text },
    ];
  };
  return [...define('low', stage.limits?.low), ...define('high', stage.limits?.high)];
}

/** Limits that are plain quantities also go to the frequency itself, so that change sheets tell when they are left. */
function numericLimits(stage: Stage): { limits?: NonNullable<QuantityDefinition['limits']> } {
  const read = (text: string | undefined): number | undefined => {
    const parsed = text === undefined ? undefined : parseQuantity(text);
    if (parsed?.ok !== true || parsed.value.range !== undefined) return undefined;
    const inUnit = convert(parsed.value.magnitude, parsed.value.unit, unitOf(stage));
    return inUnit.ok ? inUnit.value : undefined;
  };
  const [low, high] = [read(stage.limits?.low), read(stage.limits?.high)];
  if (low === undefined && high === undefined) return {};
  return { limits: { ...(low === undefined ? {} : { low }), ...(high === undefined ? {} : { high }) } };
}

/**
 * Where a mixer also hears. Image: as far beyond the injection as the signal is before it (a sum: two injections up).
 * Half-IF: midway between signal and injection; its second harmonic and that of the injection differ by the IF.
 */
function defineResponses(stage: Stage): QuantityDefinition[] {
  const [signal, injection] = stage.from.map(symbolOfStage);
  if (stage.kind !== 'mixer' || signal === undefined || injection === undefined) return [];
  const define = (part: 'image' | 'half_if', expression: string): QuantityDefinition => ({
    symbol: symbolOfPart(stage.id, part),
    label: `${stage.name}, ${part === 'image' ? 'image' : 'half-IF response'}`,
    kind: 'derived',
    unit: unitOf(stage),
    expression,
  });
  if (stage.product === 'sum') return [define('image', `${signal} + 2 * ${injection}`)];
  return [define('image', `2 * ${injection} - ${signal}`), define('half_if', `(${signal} + ${injection}) / 2`)];
}

/** Undefined where there is none or it cannot be read; compilePlan says so. */
export function toleranceOf(stage: Stage): QuantityDefinition['tolerance'] | undefined {
  if (!hasFrequency(stage) || stage.tolerance === undefined) return undefined;
  const text = stage.tolerance.trim();
  const read = readTolerance(/^\d/.test(text) ? `±${text}` : text);
  if (read?.ok !== true || read.value.rest.trim() !== '') return undefined;
  const { kind, plus, minus, unit } = read.value.tolerance;
  if (kind !== 'absolute') return { kind, plus, minus };
  const [up, down] = [plus, minus].map((each) => convert(each, unit ?? '', unitOf(stage)));
  return up?.ok === true && down?.ok === true ? { kind, plus: up.value, minus: down.value } : undefined;
}
