/**
 * A measured value against an upper limit, with a guard band: ILAC-G8:09/2019, clauses 4.1 and 4.2. Accepted up to the limit
 * less the guard band; all in one unit. For a lower limit turn the signs of value and limit.
 */
export function decide({ value, limit, guard }: { value: number; limit: number; guard: number }): 'pass' | 'fail' {
  return value <= limit - guard ? 'pass' : 'fail';
}

export type FourWayDecision = 'pass' | 'conditional pass' | 'conditional fail' | 'fail';
/** Clause 4.2.3 (from memory): within the guard band on either side of the limit, the answer says so. */
export function decideFourWay(given: { value: number; limit: number; guard: number }): FourWayDecision {
  const { value, limit, guard } = given;
  if (decide(given) === 'pass') return 'pass';
  if (value <= limit) return 'conditional pass';
  return value <= limit + guard ? 'conditional fail' : 'fail';
}
