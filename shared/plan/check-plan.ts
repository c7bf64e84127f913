import { checkCrystalHarmonics } from './check-harmonics.ts';
import { checkMixer } from './check-mixer.ts';
import { finding, type Finding } from './finding.ts';
import { phaseNoiseRiseDb } from './mixer-products.ts';
import type { FrequencyPlan, Stage } from './plan.ts';
import {
  bandOf,
  baseOf,
  frequencyOf,
  isInside,
  partOf,
  showBand,
  showHz,
  signalPathTo,
  type PlanValues,
  type ValuedPlan,
} from './signal-path.ts';
import { inStageWords, symbolOfStage } from './stage-words.ts';

/**
 * Looks a plan over at one setting; `values` is what evaluating the compiled plan gave. With tolerances evaluated, the worst
 * case is held against the limits too. Stages in the plan's order; a stage without a value says why and nothing else.
 */
export function checkPlan(plan: FrequencyPlan, values: PlanValues): Finding[] {
  const valued: ValuedPlan = { plan, values };
  return plan.stages.flatMap((stage) => {
    const missing = checkValue(valued, stage);
    if (missing.length > 0) return missing;
    return [
      ...checkLimits(valued, stage),
      ...(stage.kind === 'mixer' ? checkMixer(valued, stage) : []),
      ...(stage.kind === 'crystal' || stage.kind === 'vcxo' ? checkCrystalHarmonics(valued, stage) : []),
      ...(stage.kind === 'output' ? checkOutput(valued, stage) : []),
    ];
  });
}

function checkValue({ plan, values }: ValuedPlan, stage: Stage): Finding[] {
  const live = values[symbolOfStage(stage.id)];
  if (live !== undefined && live.value !== null) return [];
  const problem = live?.problem;
  const remedy = problem?.code === 'division-by-zero' ? ' Give a divisor other than zero.' : '';
  const says = problem === undefined ? 'it has no value. Compile the plan anew.' : inStageWords(plan, problem.message);
  return [finding(stage, ['no-value', 'alarm'], { says: `${says}${remedy}` })];
}

const limitWords = (stage: Stage): { name: string; remedy: string } => {
  if (stage.kind === 'filter') return { name: 'pass band', remedy: 'Retune it, or change what feeds it.' };
  if (stage.kind === 'vcxo' || stage.kind === 'loop' || stage.kind === 'synthesiser')
    return { name: 'tuning range', remedy: 'Choose another crystal, count or channel.' };
  return { name: 'limits', remedy: 'Change what feeds it, or the limits.' };
};

function checkLimits(valued: ValuedPlan, stage: Stage): Finding[] {
  const band = bandOf(valued, stage.id);
  if (band === undefined)
    return stage.kind === 'filter'
      ? [finding(stage, ['no-pass-band', 'doubt'], { says: 'it has no pass band. Enter its low and high limits.' })]
      : [];
  const hz = frequencyOf(valued, stage.id);
  const { name, remedy } = limitWords(stage);
  if (!isInside(hz, band))
    return [
      finding(stage, ['outside-limits', 'alarm'], {
        says: `${showHz(hz)} is outside its ${name}, ${showBand(band)}. ${remedy}`,
        hz,
      }),
    ];
  const live = valued.values[symbolOfStage(stage.id)];
  const far = [baseOf(live, 'low'), baseOf(live, 'high')].find((each) => !Number.isNaN(each) && !isInside(each, band));
  if (far !== undefined)
    return [
      finding(stage, ['tolerance-leaves-limits', 'doubt'], {
        says: `with all tolerances against it, ${showHz(hz)} becomes ${showHz(far)}, outside its ${name}, ${showBand(band)}.`,
        hz: far,
      }),
    ];
  return [
    finding(stage, ['inside-limits', 'good'], { says: `${showHz(hz)} is inside its ${name}, ${showBand(band)}.`, hz }),
  ];
}

/** Along the signal from its beginning to the output. */
function checkOutput(valued: ValuedPlan, output: Stage): Finding[] {
  const path = signalPathTo(valued, output.id);
  const inversions = path.filter(
    (stage) => stage.kind === 'mixer' && stage.product === 'difference' && stage.injection === 'high',
  ).length;
  const sidebands = finding(output, ['sidebands', 'note'], {
    says:
      inversions % 2 === 0
        ? `sidebands arrive as they were (${inversions === 0 ? 'never inverted' : `inverted ${inversions} times`}).`
        : `sidebands arrive inverted (${inversions === 1 ? 'once' : `${inversions} times`}): upper and lower change places, and so do the signs of a deviation.`,
    count: inversions,
  });
  const factor = path.reduce((product, stage) => product * deviationFactor(valued, stage), 1);
  if (factor === 1 || !Number.isFinite(factor)) return [sidebands];
  const rise = phaseNoiseRiseDb(factor);
  const deviation = finding(output, ['deviation', 'note'], {
    says:
      `a deviation, and an error in hertz, is multiplied by ${Number(factor.toPrecision(6))} on its way here; ` +
      `phase noise ${rise < 0 ? 'falls' : 'rises'} by ${Math.abs(rise).toFixed(1)} dB.`,
    count: factor,
  });
  return [sidebands, deviation];
}

/** By how much a stage multiplies a deviation of what feeds it: a mixer and a filter leave it as it is. */
function deviationFactor(valued: ValuedPlan, { kind, id }: Stage): number {
  switch (kind) {
    case 'multiplier':
      return partOf(valued, id, 'factor');
    case 'divider':
      return 1 / partOf(valued, id, 'divisor');
    case 'synthesiser':
    case 'loop':
      return partOf(valued, id, 'n') / partOf(valued, id, 'r');
    default:
      return 1;
  }
}
