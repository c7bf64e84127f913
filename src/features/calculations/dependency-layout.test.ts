import { describe, expect, it } from 'vitest';
import { kinOf, layoutOf } from './dependency-layout.ts';

const links = new Map([
  ['carrier', ['channel']],
  ['injection', ['carrier', 'firstIf']],
  ['crystal', ['injection', 'multiplier']],
  ['error', ['injection', 'tolerance']],
  ['low', ['injection', 'error']],
]);
const order = ['channel', 'firstIf', 'multiplier', 'tolerance', 'carrier', 'injection', 'crystal', 'error', 'low'];

describe('the drawing of what rests on what', () => {
  const { nodes, lines } = layoutOf(order, links);
  const placeOf = new Map(nodes.map((node) => [node.symbol, node]));

  it('puts each value behind all that it rests on, and what is given right before what it feeds', () => {
    for (const { from, to } of lines) expect(placeOf.get(from)?.layer).toBeLessThan(placeOf.get(to)?.layer ?? 0);
    expect(placeOf.get('multiplier')?.layer).toBe((placeOf.get('crystal')?.layer ?? 0) - 1);
  });

  it('gives no two values one place, and no line a place that a value has', () => {
    const taken = nodes.map(({ layer, row }) => `${layer} ${row}`);
    expect(new Set(taken).size).toBe(nodes.length);
    for (const { through } of lines)
      for (const { layer, row } of through) expect(taken).not.toContain(`${layer} ${row}`);
    expect(lines.find(({ from, to }) => from === 'injection' && to === 'low')?.through).toHaveLength(1);
  });

  it('shows one value with its kin only', () => {
    expect(kinOf('crystal', order, links)).toEqual([
      'channel',
      'firstIf',
      'multiplier',
      'carrier',
      'injection',
      'crystal',
    ]);
  });
});
