import { z } from 'zod';

/**
 * A frequency plan: the signal chain of a set as stages that feed each other. Each stage yields one frequency, the quantity
 * `plan_<id>`. Parameters are formulas of the engine as text: a number with its unit, a symbol of the manual, or more.
 */

/** `__` is kept for the quantities that belong to a stage: `plan_mixer1__image`. */
const stageId = z
  .string()
  .max(30)
  .regex(/^[A-Za-z][A-Za-z0-9]*(?:_[A-Za-z0-9]+)*$/, 'Use letters, digits and single _, beginning with a letter.');
/** The parameters may be empty while a plan is being drawn: the stage then says what is missing. */
const formula = z.string().max(300);
/** `"455 kc"` as paper writes it, or a formula with units. */
const limit = z.string().max(120);

const common = {
  id: stageId,
  name: z.string().max(80),
  /** Stages that feed this one. A mixer: signal, then injection. A loop: reference, then the offset mix if it has one. */
  from: z.array(stageId).max(2),
  /** A filter's pass band, a tunable stage's range, any other stage's working range. */
  limits: z.object({ low: limit.optional(), high: limit.optional() }).optional(),
  /** The unit to show the frequency in; MHz where none is given. */
  unit: z.string().max(20).optional(),
  /** What the manual prints for this frequency, unit included; provePlan holds it against the plan. */
  printed: z.string().max(120).optional(),
  /** Where it stands in the drawing. */
  place: z.object({ x: z.number(), y: z.number() }).optional(),
};
/** `±0.002 percent`, `± 20 ppm`, `± 5 kc`: of a stage whose frequency comes from outside. */
const tolerance = z.string().max(60).optional();
const source = { ...common, from: z.array(stageId).max(0).default([]), frequency: formula, tolerance };
const ratio = { n: formula, r: formula.default('1') };

export const stage = z.discriminatedUnion('kind', [
  z.object({ ...source, kind: z.literal('input') }),
  z.object({ ...source, kind: z.literal('crystal') }),
  z.object({ ...source, kind: z.literal('vcxo') }),
  /** Reference x n / r. */
  z.object({ ...common, ...ratio, kind: z.literal('synthesiser') }),
  z.object({ ...common, kind: z.literal('multiplier'), factor: formula }),
  z.object({ ...common, kind: z.literal('divider'), divisor: formula }),
  z.object({
    ...common,
    kind: z.literal('mixer'),
    product: z.enum(['sum', 'difference']),
    /** On which side of the signal the injection lies; a difference with high injection inverts the sidebands. */
    injection: z.enum(['high', 'low']),
  }),
  z.object({ ...common, kind: z.literal('filter') }),
  /** Reference x n / r, above or below the offset mix where there is one. */
  z.object({ ...common, ...ratio, kind: z.literal('loop'), side: z.enum(['above', 'below']).default('above') }),
  z.object({ ...common, kind: z.literal('output') }),
]);

export const frequencyPlan = z.object({ stages: z.array(stage).max(200) });

export type Stage = z.infer<typeof stage>;
export type StageKind = Stage['kind'];
export type StageOf<Kind extends StageKind> = Extract<Stage, { kind: Kind }>;
export type FrequencyPlan = z.infer<typeof frequencyPlan>;
