import { feedsOf } from '#shared/plan/define-stage.ts';
import type { FrequencyPlan, Stage, StageKind } from '#shared/plan/plan.ts';

/** What each kind of stage is called, and what sets it apart. */
export const stageWords: Record<StageKind, { word: string; says: string }> = {
  input: { word: 'input', says: 'A signal that comes in, at a frequency of this manual' },
  crystal: { word: 'crystal oscillator', says: 'A frequency that a crystal gives' },
  vcxo: { word: 'variable crystal oscillator', says: 'A crystal that is pulled within a range' },
  synthesiser: { word: 'synthesiser', says: 'Reference times N over R' },
  multiplier: { word: 'multiplier', says: 'The same frequency so many times' },
  divider: { word: 'divider', says: 'One of so many parts of the frequency' },
  mixer: { word: 'mixer', says: 'Sum or difference of signal and injection' },
  filter: { word: 'filter', says: 'Lets a band of frequencies pass' },
  loop: { word: 'phase-locked loop', says: 'Locked to its reference, beside an offset if there is one' },
  output: { word: 'output', says: 'Where the signal leaves' },
};

/** A new stage of a kind, fed by what is given, with what the kind needs left to be filled in. */
function newStage(kind: StageKind, { id, from, name = '' }: { id: string; from: string[]; name?: string }): Stage {
  const common = { id, name, from: from.slice(0, feedsOf[kind].names.length) };
  switch (kind) {
    case 'input':
    case 'crystal':
    case 'vcxo':
      return { ...common, kind, from: [], frequency: '' };
    case 'synthesiser':
      return { ...common, kind, n: '', r: '1' };
    case 'loop':
      return { ...common, kind, n: '', r: '1', side: 'above' };
    case 'multiplier':
      return { ...common, kind, factor: '' };
    case 'divider':
      return { ...common, kind, divisor: '' };
    case 'mixer':
      return { ...common, kind, product: 'difference', injection: 'low' };
    default:
      return { ...common, kind };
  }
}

/** Adds a stage of a kind, fed by the given one. */
export function withStage(
  { stages }: FrequencyPlan,
  kind: StageKind,
  behind: string | null,
): { plan: FrequencyPlan; id: string } {
  const taken = new Set(stages.map(({ id }) => id));
  let count = 1;
  while (taken.has(`${kind}${count}`)) count += 1;
  const id = `${kind}${count}`;
  return { id, plan: { stages: [...stages, newStage(kind, { id, from: behind === null ? [] : [behind] })] } };
}

/** Takes a stage away; what it fed is fed by nothing in its place. */
export const withoutStage = ({ stages }: FrequencyPlan, id: string): FrequencyPlan => ({
  stages: stages
    .filter((stage) => stage.id !== id)
    .map((stage) =>
      withFeeds(
        stage,
        stage.from.filter((each) => each !== id),
      ),
    ),
});

export const withFeeds = (stage: Stage, from: string[]): Stage => ({ ...stage, from });

export const withChanged = ({ stages }: FrequencyPlan, changed: Stage): FrequencyPlan => ({
  stages: stages.map((stage) => (stage.id === changed.id ? changed : stage)),
});

/** The same stage as another kind: its name, feeds and limits stay, as far as the kind has them. */
export function asKind(stage: Stage, kind: StageKind): Stage {
  const { id, name, from, limits, unit } = stage;
  const made = newStage(kind, { id, name, from });
  return {
    ...made,
    ...(limits === undefined ? {} : { limits }),
    ...(unit === undefined ? {} : { unit }),
  };
}
