import fc from 'fast-check';
import { evaluate as evaluateWithMathjs } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { compileDerivative } from './compile-derivative.ts';
import { compileExpression } from './compile-expression.ts';
import { planCode, placeCode, runPlan } from './flat-code.ts';
import { scope, slots } from './formula.fixture.ts';
import { functionDefinitions } from './functions.ts';
import { lowerExpression, startCode } from './lower-expression.ts';
import { parseExpression } from './parse-expression.ts';
import { printExpression } from './print-expression.ts';
import type { Expression, ExpressionNode } from './tree.ts';

/** Random trees of plain numbers and two symbols, written in every form of the grammar. */
const tree = fc.letrec<{ node: string }>((tie) => ({
  node: fc.oneof(
    { maxDepth: 5 },
    fc.integer({ min: 0, max: 999 }).map((each) => String(each / 10)),
    fc.constantFrom('n', 'channel', 'pi'),
    fc.tuple(tie('node'), fc.constantFrom('+', '-', '*', '/'), tie('node')).map(([a, op, b]) => `(${a}) ${op} (${b})`),
    tie('node').map((a) => `-(${a})`),
    tie('node').map((a) => `(${a})^2`),
    tie('node').map((a) => `abs(${a})`),
    fc.tuple(tie('node'), tie('node'), tie('node')).map(([a, b, c]) => `((${a}) < (${b}) ? (${b}) : (${c}))`),
    fc.tuple(tie('node'), tie('node')).map(([a, b]) => `max(${a}, ${b})`),
  ),
})).node;

/** A tree without its places: reading and writing may move things, not change them. */
const shape = (node: ExpressionNode): unknown =>
  JSON.parse(JSON.stringify(node, (key, value: unknown) => (key === 'place' ? undefined : value)));

describe('reading and writing', () => {
  it('gives the same tree after writing and reading again', () => {
    fc.assert(
      fc.property(tree, (text) => {
        const first = parseExpression(text);
        fc.pre(first.ok);
        const again = parseExpression(printExpression(first.value.root));
        expect(again.ok && shape(again.value.root)).toEqual(shape(first.value.root));
      }),
    );
  });

  it('never throws, whatever it is given', () => {
    const scraps = fc.array(
      fc.constantFrom(
        '1',
        'n',
        '(',
        ')',
        '+',
        '-',
        '/',
        '^',
        '?',
        ':',
        '<',
        ',',
        'MHz',
        '"a"',
        ' ',
        'lookup(',
        'min(',
        '2 kc',
        'to',
        '!=',
      ),
    );
    fc.assert(
      fc.property(scraps, (parts) => typeof parseExpression(parts.join('')).ok === 'boolean'),
      { numRuns: 2000 },
    );
    expect(parseExpression('-'.repeat(1999) + '1')).toMatchObject({ ok: false, error: { code: 'too-long' } });
    expect(parseExpression('1+'.repeat(999) + '1')).toMatchObject({ ok: true });
  });
});

describe('computing', () => {
  it('agrees with the full mathjs on plain numbers', () => {
    fc.assert(
      fc.property(tree, (text) => {
        const parsed = parseExpression(text);
        fc.pre(parsed.ok);
        const own = compileExpression(parsed.value, scope)(slots);
        fc.pre(Number.isFinite(own));
        const theirs: unknown = evaluateWithMathjs(text, { n: 9, channel: 12 });
        expect(Math.abs(own - Number(theirs))).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(own)));
      }),
    );
  });
});

/** One formula as flat code, on its own: its slot is the one behind the fixture's. */
function runFlat(expression: Expression, values: Float64Array): number {
  const code = startCode(values.length + 1);
  lowerExpression(expression, { code, scope, owner: values.length });
  const placed = placeCode(code);
  const registers = placed.initial.slice();
  registers.set(values);
  runPlan(planCode(placed, registers));
  return registers[values.length] ?? NaN;
}

const richTree = fc.letrec<{ node: string }>((tie) => ({
  node: fc.oneof(
    { maxDepth: 5 },
    tree,
    fc
      .tuple(tie('node'), fc.constantFrom('+', '-', '*', '/', '^'), tie('node'))
      .map(([a, op, b]) => `(${a}) ${op} (${b})`),
    fc
      .tuple(tie('node'), fc.constantFrom('<', '<=', '>', '>=', '==', '!='), tie('node'), tie('node'), tie('node'))
      .map(([a, sign, b, c, d]) => `((${a}) ${sign} (${b}) ? (${c}) : (${d}))`),
    fc
      .tuple(fc.constantFrom('min', 'max'), tie('node'), tie('node'), tie('node'))
      .map(([f, ...args]) => `${f}(${args.join(', ')})`),
    fc
      .tuple(fc.constantFrom('round', 'floor', 'ceil'), tie('node'), tie('node'))
      .map(([f, a, b]) => `${f}(${a}, ${b})`),
    fc.tuple(fc.constantFrom('round', 'floor', 'ceil', 'sqrt', 'log10'), tie('node')).map(([f, a]) => `${f}(${a})`),
    tie('node').map((a) => `lookup("plan", ${a}, "ship")`),
  ),
})).node;

describe('flat code', () => {
  it('gives bit for bit what the closures give, without -0, and nothing where anything it names is missing', () => {
    fc.assert(
      fc.property(richTree, fc.constantFrom(9, 0, -2.5, NaN), (text, n) => {
        const parsed = parseExpression(text);
        fc.pre(parsed.ok);
        const values = slots.slice();
        values[3] = n;
        const own = compileExpression(parsed.value, scope)(values);
        const isMissing = !Number.isFinite(own) || (Number.isNaN(n) && parsed.value.symbols.includes('n'));
        expect(runFlat(parsed.value, values)).toBe(isMissing ? NaN : own + 0);
      }),
      { numRuns: 10_000 },
    );
    // Parsing ten thousand formulas takes its time on a busy machine.
  }, 60_000);

  it.each(functionDefinitions)('knows $name', ({ example }) => {
    const parsed = parseExpression(example.text);
    if (!parsed.ok) throw new Error(parsed.error.message);
    expect(runFlat(parsed.value, slots)).toBe(compileExpression(parsed.value, scope)(slots));
  });

  it('agrees with the full mathjs', () => {
    fc.assert(
      fc.property(tree, (text) => {
        const parsed = parseExpression(text);
        fc.pre(parsed.ok);
        const own = runFlat(parsed.value, slots);
        fc.pre(Number.isFinite(own));
        const theirs: unknown = evaluateWithMathjs(text, { n: 9, channel: 12 });
        expect(Math.abs(own - Number(theirs))).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(own)));
      }),
      { numRuns: 10_000 },
    );
  }, 60_000);
});

describe('slopes', () => {
  it('agree with small differences', () => {
    fc.assert(
      fc.property(tree, fc.integer({ min: 1, max: 50 }), (text, x) => {
        const parsed = parseExpression(text);
        fc.pre(parsed.ok);
        const [compiled, derivative] = [compileExpression(parsed.value, scope), compileDerivative(parsed.value, scope)];
        const at = (value: number) => compiled(Float64Array.from([0, 0, 12, value, 0, 0, 0]));
        const step = x * 1e-5;
        const [below, middle, above] = [at(x - step), at(x), at(x + step)];
        const difference = (above - below) / (2 * step);
        const [left, right] = [(middle - below) / step, (above - middle) / step];
        // Corners of abs, max and comparisons have two slopes: nothing to compare there, nor where numbers run away.
        fc.pre([below, middle, above].every((each) => Number.isFinite(each) && Math.abs(each) < 1e6));
        fc.pre(Math.abs(left - right) < 1e-4 * (1 + Math.abs(difference)));
        const slope = derivative(Float64Array.from([0, 0, 12, x, 0, 0, 0]), Float64Array.from([0, 0, 0, 1, 0, 0, 0]));
        expect(Math.abs(slope - difference)).toBeLessThan(1e-3 * (1 + Math.abs(difference)));
      }),
    );
  });

  it('are exact on a receiver: the crystal moves a ninth of the carrier', () => {
    const parsed = parseExpression('(carrier - first_if) / n');
    const slope = parsed.ok
      ? compileDerivative(parsed.value, scope)(slots, Float64Array.from([1, 0, 0, 0, 0, 0, 0]))
      : NaN;
    expect(slope).toBe(1 / 9);
  });
});
