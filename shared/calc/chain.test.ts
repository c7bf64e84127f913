import { describe, expect, it } from 'vitest';
import { chainCases, chainSources } from './chain.cases.ts';
import { decide, decideFourWay } from './decide.ts';
import { decisionCases, exposureCases } from './decision.cases.ts';
import { evaluate } from './evaluate.ts';
import { compile } from './program.ts';
import { derived, input } from './sample-quantities.fixture.ts';

/** Symbols of a case may be words that formulas keep for units (V, F, M, C): each gets a letter in front. */
const safe = (expression: string): string =>
  expression.replace(/[A-Za-z_][A-Za-z0-9_]*/g, (name, at: number) =>
    /^(?:sqrt|log10|abs|max|min|pi)$/.test(name) || /\d$/.test(expression.slice(0, at)) ? name : `x_${name}`,
  );

describe('published worked values', () => {
  it.each(chainCases)('$what', ({ expression, given, expected, tolerance, source }) => {
    expect(chainSources[source]).not.toBe('');
    const program = compile([
      ...Object.entries(given).map(([name, home]) => input(`x_${name}`, { home })),
      derived('y', safe(expression)),
    ]);
    expect(program.problems).toEqual([]);
    const value = evaluate(program).values['y']?.value ?? NaN;
    expect(Math.abs(value - expected)).toBeLessThanOrEqual(tolerance);
  });
});

describe('decisions with a guard band', () => {
  it.each(decisionCases)('$value against $limit less $guard', ({ decision, fourWay, ...given }) => {
    expect(decide(given)).toBe(decision);
    if (given.guard > 0) expect(decideFourWay(given)).toBe(fourWay ?? decision);
  });
});

/** 47 CFR 1.1310, table 1 (2015), as a formula of a manual would have it: f in MHz, S in mW/cm². */
const exposure = {
  occupational: 'f <= 3 ? 100 : (f <= 30 ? 900 / f^2 : (f <= 300 ? 1 : (f <= 1500 ? f / 300 : 5)))',
  general: 'f <= 1.34 ? 100 : (f <= 30 ? 180 / f^2 : (f <= 300 ? 0.2 : (f <= 1500 ? f / 1500 : 1)))',
};
describe('limits of exposure', () => {
  it.each(exposureCases)('$mhz MHz, $set: $density', ({ mhz, set, density }) => {
    const program = compile([input('x_f', { home: mhz }), derived('y', safe(exposure[set]))]);
    expect(evaluate(program).values['y']?.value).toBeCloseTo(density, 10);
  });
});
