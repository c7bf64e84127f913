import { describe, expect, it } from 'vitest';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import { maritimeVhf } from '#shared/calc/plans/maritime.ts';
import { compile } from '#shared/calc/program.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { checkPlan } from '#shared/plan/check-plan.ts';
import { compilePlan } from '#shared/plan/compile-plan.ts';
import { proof } from '#shared/calc/proof.ts';
import { quantityDefinition } from '#shared/calc/quantity.ts';
import { demoManuals } from './manuals.ts';
import { shipFrequencyKc } from './maritime-channels.ts';

describe.each(demoManuals)('the proof of $title', ({ quantities }) => {
  it('holds for every printed number', () => {
    const definitions = quantities.map(({ printed, ...quantity }) =>
      quantityDefinition.parse({ ...quantity, printed: { text: printed.text } }),
    );
    const { holds, items } = proof(compile(definitions, builtInTables));
    expect(items.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(holds).toBe(true);
    expect(items).toHaveLength(quantities.length);
  });
});

describe.each(demoManuals.filter(({ plan }) => plan !== undefined))(
  'the signal chain of $title',
  ({ plan, quantities }) => {
    it('works on every channel of the plan, and gives the i-f that the manual prints', () => {
      if (plan === undefined) return;
      const own = quantities.map(({ printed, ...quantity }) =>
        quantityDefinition.parse({ ...quantity, printed: { text: printed.text } }),
      );
      const { definitions, problems } = compilePlan(plan, own, builtInTables);
      expect(problems).toEqual([]);
      const program = compile([...own, ...definitions], builtInTables);
      for (const [channel = NaN] of maritimeVhf.rows) {
        const { values } = evaluate(program, { channel });
        expect(checkPlan(plan, values).filter(({ weight }) => weight === 'alarm')).toEqual([]);
        expect(values['plan_discriminator']?.value).toBeCloseTo(455, 9);
      }
    });
  },
);

it('prints the channels that the built-in plan has, reckoned apart from it', () => {
  for (const [channel = NaN, shipMc = NaN] of maritimeVhf.rows) {
    expect(Math.round(shipMc * 1000), `channel ${channel}`).toBe(shipFrequencyKc(channel));
  }
});
