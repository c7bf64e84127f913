import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluate } from './evaluate.ts';
import { createSession } from './live-session.ts';
import { compile } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';

const inputCount = 6;
/** Random programs: formulas of quantities before them, some of which can fail. Definitions are shuffled: order is not given away. */
const programs = fc
  .array(fc.tuple(fc.constantFrom('+', '-', '*', '/', 'max', 'sqrt', '?'), fc.nat(), fc.nat()), {
    minLength: 1,
    maxLength: 30,
  })
  .chain((steps) => {
    const inputs = Array.from({ length: inputCount }, (_, at): QuantityDefinition => ({
      symbol: `q${at}`,
      label: '',
      kind: 'input',
      unit: '',
      home: at + 1,
    }));
    const derived = steps.map(([form, left, right], at): QuantityDefinition => {
      const [a, b] = [`q${left % (inputCount + at)}`, `q${right % (inputCount + at)}`];
      const forms: Record<string, string> = {
        max: `max(${a}, ${b})`,
        sqrt: `sqrt(${a} - ${b})`,
        '?': `${a} < ${b} ? ${a} : ${b} * 2`,
      };
      return {
        symbol: `q${inputCount + at}`,
        label: '',
        kind: 'derived',
        unit: '',
        expression: forms[form] ?? `${a} ${form} ${b}`,
      };
    });
    return fc.shuffledSubarray([...inputs, ...derived], { minLength: inputs.length + derived.length });
  });
const changes = fc.array(
  fc.tuple(
    fc.nat({ max: inputCount - 1 }),
    fc.oneof(fc.integer({ min: -3, max: 3 }), fc.constantFrom('2', 'x', '3 v', '1e2')),
  ),
  { maxLength: 12 },
);

describe('a live session', () => {
  it('always shows what a full computation would show, and names exactly what changed', () => {
    fc.assert(
      fc.property(programs, changes, (definitions, steps) => {
        const program = compile(definitions);
        const session = createSession(program);
        const inputs: Record<string, number | string> = {};
        for (const [at, value] of steps) {
          const before = session.readAll();
          inputs[`q${at}`] = value;
          const { changed } = session.set(`q${at}`, value);
          const after = session.readAll();
          expect(after).toEqual(evaluate(program, inputs).values);
          const different = Object.keys(after).filter(
            (symbol) => JSON.stringify(before[symbol]) !== JSON.stringify(after[symbol]),
          );
          expect(changed.toSorted()).toEqual(expect.arrayContaining(different));
          expect(
            changed.every(
              (symbol) =>
                before[symbol]?.value !== after[symbol]?.value ||
                before[symbol]?.problem?.message !== after[symbol]?.problem?.message,
            ),
          ).toBe(true);
        }
        session.reset();
        expect(session.readAll()).toEqual(evaluate(program).values);
      }),
      { numRuns: 200 },
    );
  });

  const program = compile([
    { symbol: 'a1', label: '', kind: 'input', unit: '', home: 1 },
    { symbol: 'b1', label: '', kind: 'input', unit: '', home: 2 },
    { symbol: 'c1', label: '', kind: 'derived', unit: '', expression: 'a1 + 1' },
    { symbol: 'd1', label: '', kind: 'derived', unit: '', expression: 'max(c1, 10)' },
    { symbol: 'e1', label: '', kind: 'derived', unit: '', expression: 'd1 + b1' },
  ]);

  it('stops where a value comes out the same', () => {
    const session = createSession(program);
    expect(session.set('a1', 3).changed).toEqual(['a1', 'c1']);
    expect(session.set('a1', 3).changed).toEqual([]);
    expect(session.set('a1', 20).changed).toEqual(['a1', 'c1', 'd1', 'e1']);
    expect(session.reset('a1').changed).toEqual(['a1', 'c1', 'd1', 'e1']);
  });

  it('takes a bad value back as soon as a good one comes', () => {
    const session = createSession(program, { b1: 5 });
    session.set('a1', 'x');
    expect(session.read('e1')).toMatchObject({ value: null, problem: { cause: 'a1' } });
    session.set('a1', 20);
    expect(session.read('e1')).toMatchObject({ value: 26 });
    expect(session.read('e1')).not.toHaveProperty('problem');
  });

  it('says why something cannot be set', () => {
    const session = createSession(program);
    expect(session.set('c1', 3)).toMatchObject({ changed: [], problem: { code: 'not-an-input' } });
    expect(session.set('zz', 3)).toMatchObject({ changed: [], problem: { code: 'unknown-symbol' } });
    expect(session.read('zz')).toBeUndefined();
  });
});

describe('ten thousand quantities', () => {
  const size = 10_000;
  const chain = Array.from({ length: size }, (_, at): QuantityDefinition =>
    at === 0
      ? { symbol: 'q0', label: '', kind: 'input', unit: 'MHz', home: 1 }
      : { symbol: `q${at}`, label: '', kind: 'derived', unit: 'MHz', expression: `q${at - 1} + 1 kHz` },
  ).reverse();
  const program = compile(chain);

  it('compile in one chain without running out of stack', () => {
    expect(program.problems).toEqual([]);
    expect(program.order.at(-1)).toBe(`q${size - 1}`);
    expect(evaluate(program).values[`q${size - 1}`]?.value).toBeCloseTo(1 + (size - 1) / 1000, 9);
  });

  it('change from end to end, every one of them', () => {
    const session = createSession(program);
    for (let turn = 1; turn <= 5; turn += 1) expect(session.set('q0', 1 + turn).changed).toHaveLength(size);
  });
});
