import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkPlan } from './check-plan.ts';
import { compilePlan } from './compile-plan.ts';
import { frequencyPlan } from './plan.ts';
import { run } from './plans.fixture.ts';
import { provePlan } from './prove-plan.ts';

const id = fc.constantFrom('a', 'b', 'c', 'd', 'e_1');
const text = fc.constantFrom(
  '',
  '0',
  '9',
  '16.2 MHz',
  '455 kc',
  '3 v',
  'carrier',
  'plan_a',
  '1 +',
  '((',
  '-1',
  '10 to 12 MHz',
  'pi',
);
const kind = fc.constantFrom(
  'input',
  'crystal',
  'vcxo',
  'synthesiser',
  'multiplier',
  'divider',
  'mixer',
  'filter',
  'loop',
  'output',
);
const anyStage = fc
  .record({
    ...{ id, kind, name: fc.constantFrom('', 'V1', 'mixer "x"'), from: fc.array(id, { maxLength: 2 }) },
    ...{
      frequency: text,
      n: text,
      r: text,
      factor: text,
      divisor: text,
      printed: text,
      tolerance: fc.constantFrom('', '20 ppm', 'some'),
    },
    ...{ product: fc.constantFrom('sum', 'difference'), injection: fc.constantFrom('high', 'low') },
    limits: fc.record({ low: text, high: text }),
  })
  .map((stage) => (['input', 'crystal', 'vcxo'].includes(stage.kind) ? { ...stage, from: [] } : stage));

describe('any plan at all', () => {
  it('compiles, evaluates, is checked and proved without throwing, and every stage without a value says why', () => {
    fc.assert(
      fc.property(fc.array(anyStage, { maxLength: 6 }), (stages) => {
        const plan = frequencyPlan.parse({ stages });
        const { problems } = compilePlan(plan, []);
        // A symbol that a person wrote stays as written where no stage has it.
        const symbols = plan.stages.map((stage) => new RegExp(`\\bplan_${stage.id}\\b`));
        for (const { message } of problems) expect(symbols.filter((symbol) => symbol.test(message))).toEqual([]);
        const { values } = run(plan);
        const findings = checkPlan(plan, values);
        for (const stage of plan.stages) {
          if (values[`plan_${stage.id}`]?.value !== null) continue;
          expect(findings.some((each) => each.stage === stage.id && each.code === 'no-value')).toBe(true);
        }
        provePlan(plan, []);
      }),
      { numRuns: 150 },
    );
  });
});
