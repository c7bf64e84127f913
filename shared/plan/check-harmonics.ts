import { finding, type Finding } from './finding.ts';
import type { Stage } from './plan.ts';
import { commonBand, filtersAfter, frequencyOf, isInside, showHz, type Band, type ValuedPlan } from './signal-path.ts';
import { nameStage } from './stage-words.ts';

/** Harmonics beyond this are lost in most sets; common practice, no source. */
const highestHarmonic = 30;
/** How near is near where no pass band says it: 0.1 % either side. Common practice, no source. */
const nearShare = 1e-3;

/** Harmonics of a crystal that fall on a signal or an IF of the plan, where they would be heard as a carrier of their own. */
export function checkCrystalHarmonics(valued: ValuedPlan, crystal: Stage): Finding[] {
  const hz = frequencyOf(valued, crystal.id);
  if (!(hz > 0)) return [];
  return listenersOf(valued, crystal.id).flatMap(({ stage, band }) => {
    const first = Math.max(1, Math.ceil(band.low / hz));
    if (first > highestHarmonic || !isInside(first * hz, band)) return [];
    return [
      finding(crystal, ['crystal-harmonic', 'doubt'], {
        says:
          `${first === 1 ? 'it' : `its harmonic ${first}`} falls at ${showHz(first * hz)}, on ${nameStage(stage)} ` +
          `(${showHz(frequencyOf(valued, stage.id))}). Screen it, or move the crystal or the IF.`,
        hz: first * hz,
      }),
    ];
  });
}

/** Inputs and mixers' outputs that do not come from this crystal alone, each with the band it listens to. */
function listenersOf(valued: ValuedPlan, crystal: string): { stage: Stage; band: Band }[] {
  return valued.plan.stages.flatMap((stage) => {
    if (stage.kind !== 'input' && stage.kind !== 'mixer') return [];
    const hz = frequencyOf(valued, stage.id);
    if (!(hz > 0) || sourcesOf(valued, stage.id).every((id) => id === crystal)) return [];
    return [{ stage, band: stage.kind === 'input' ? heardAround(valued, stage, hz) : bandAfter(valued, stage, hz) }];
  });
}

function bandAfter(valued: ValuedPlan, stage: Stage, hz: number): Band {
  return (
    commonBand(valued, filtersAfter(valued, stage.id)) ?? { low: hz * (1 - nearShare), high: hz * (1 + nearShare) }
  );
}

/** A filter ahead of the first mixer is far wider than what is heard: the IF behind that mixer decides. */
function heardAround(valued: ValuedPlan, input: Stage, hz: number): Band {
  const reached = new Set([input.id, ...filtersAfter(valued, input.id).map(({ id }) => id)]);
  const mixers = valued.plan.stages.filter(({ kind, from }) => kind === 'mixer' && reached.has(from[0] ?? ''));
  const widths = mixers.flatMap(({ id }) => {
    const band = commonBand(valued, filtersAfter(valued, id));
    const width = band === undefined ? Infinity : band.high - band.low;
    return width > 0 && Number.isFinite(width) ? [width / 2] : [];
  });
  const reach = widths.length === 0 ? hz * nearShare : Math.max(...widths);
  return { low: hz - reach, high: hz + reach };
}

/** Where all that reaches a stage begins. */
function sourcesOf({ plan }: ValuedPlan, id: string): string[] {
  const seen = new Set<string>();
  const visit = (at: string): string[] => {
    if (seen.has(at)) return [];
    seen.add(at);
    const from = plan.stages.find((each) => each.id === at)?.from ?? [];
    return from.length === 0 ? [at] : from.flatMap(visit);
  };
  return visit(id);
}
