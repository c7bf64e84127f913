import { describe, expect, it } from 'vitest';
import { planOf } from './plans.fixture.ts';
import { provePlan } from './prove-plan.ts';

/** The chain of the invented HB-12 with its printed frequencies, some of which a test may bend. */
const chain = (bent: { tripler?: string; injection?: string; factor?: string } = {}) =>
  planOf(
    { id: 'rf', kind: 'input', frequency: '156.600 mc', printed: '156.600 mc' },
    { id: 'y1', kind: 'crystal', name: 'Y1', frequency: '16.211111 mc', printed: '16.211111 mc' },
    { id: 'tripler1', kind: 'multiplier', name: 'V4', from: ['y1'], factor: '3', printed: bent.tripler ?? '48.633 mc' },
    {
      id: 'tripler2',
      kind: 'multiplier',
      name: 'V5',
      from: ['tripler1'],
      factor: bent.factor ?? '3',
      printed: bent.injection ?? '145.900 mc',
    },
    {
      id: 'mixer1',
      kind: 'mixer',
      name: 'V2',
      from: ['rf', 'tripler2'],
      product: 'difference',
      injection: 'low',
      printed: '10.700 mc',
    },
  );
const verdicts = (plan: ReturnType<typeof planOf>) =>
  provePlan(plan, []).map(({ stage, agrees, followsFromFeeds }) => [stage, agrees, followsFromFeeds]);

describe('the proof of a plan', () => {
  it('holds where every printed frequency comes out, rounding included', () => {
    // 3 x 48.633 is 145.899: within the rounding of 48.633333 to three decimals.
    expect(verdicts(chain())).toEqual([
      ['rf', true, null],
      ['y1', true, null],
      ['tripler1', true, true],
      ['tripler2', true, true],
      ['mixer1', true, true],
    ]);
  });

  it('finds a misprint: that stage disagrees, and the one behind it no longer follows', () => {
    const found = provePlan(chain({ tripler: '48.363 mc' }), []);
    expect(found.filter(({ agrees }) => !agrees)).toMatchObject([
      { stage: 'tripler1', computed: '48.633 mc', followsFromFeeds: false },
    ]);
    expect(found.find(({ stage }) => stage === 'tripler1')?.says).toBe(
      'Multiplier "V4": 48.363 mc as printed disagrees: the plan gives 48.633 mc. It does not follow from what is printed before it: look at this stage and its print.',
    );
    expect(found.find(({ stage }) => stage === 'tripler2')).toMatchObject({ agrees: true, followsFromFeeds: false });
  });

  it('finds a wrong factor: the stages behind it only pass it on', () => {
    expect(verdicts(chain({ factor: '2' }))).toEqual([
      ['rf', true, null],
      ['y1', true, null],
      ['tripler1', true, true],
      ['tripler2', false, false],
      ['mixer1', false, true],
    ]);
  });

  it('says so where the plan gives no value', () => {
    const plan = planOf({ id: 'y1', kind: 'crystal', name: 'Y1', frequency: '', printed: '16.2 mc' });
    expect(provePlan(plan, [])[0]).toMatchObject({ agrees: true });
    const broken = planOf({ id: 'x', kind: 'divider', name: 'D', from: ['y'], divisor: '2', printed: '8 mc' });
    expect(provePlan(broken, [])[0]).toMatchObject({ agrees: false, computed: '' });
  });
});
