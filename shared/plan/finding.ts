import type { Stage } from './plan.ts';
import { beginSentence, nameStage } from './stage-words.ts';

/** One thing that checking a plan found. `alarm`: it will not work as set. `doubt`: look at it. `good` and `note`: for the record. */
export type Finding = {
  stage: string;
  code:
    | 'no-value'
    | 'outside-limits'
    | 'inside-limits'
    | 'tolerance-leaves-limits'
    | 'no-pass-band'
    | 'wrong-injection'
    | 'image'
    | 'half-if'
    | 'product-in-if'
    | 'no-if-filter'
    | 'crystal-harmonic'
    | 'sidebands'
    | 'deviation';
  weight: 'alarm' | 'doubt' | 'note' | 'good';
  message: string;
  /** The frequency in question, in Hz. */
  hz?: number;
  /** How often the sidebands are inverted, or how many times the deviation is multiplied. */
  count?: number;
};
type More = Pick<Finding, 'hz' | 'count'>;

/** `Mixer "First mixer": ...` */
export const finding = (
  stage: Stage,
  [code, weight]: readonly [Finding['code'], Finding['weight']],
  { says, ...more }: More & { says: string },
): Finding => ({
  stage: stage.id,
  code,
  weight,
  message: `${beginSentence(nameStage(stage))}: ${says}`,
  ...more,
});
