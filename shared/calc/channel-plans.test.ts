import { describe, expect, it } from 'vitest';
import { maritimeVhf } from './channel-plans.ts';
import { describeKeys, viewTable } from './tables.ts';

describe('the maritime plan', () => {
  const view = viewTable(maritimeVhf);
  // ITU Radio Regulations, Appendix 18 (from memory; agreeing with 47 CFR 80.373(f), 2015, and two published lists).
  it.each([
    [1, 156.05, 160.65],
    [7, 156.35, 160.95],
    [12, 156.6, 156.6],
    [16, 156.8, 156.8],
    [20, 157, 161.6],
    [28, 157.4, 162],
    [60, 156.025, 160.625],
    [70, 156.525, 156.525],
    [77, 156.875, 156.875],
    [87, 157.375, 157.375],
    [88, 157.425, 157.425],
  ])('channel %d is %d / %d MHz', (channel, ship, coast) => {
    expect(maritimeVhf.rows.find(([key]) => key === channel)).toEqual([channel, ship, coast]);
    expect(view?.columns.get('coast')?.read(channel)).toBe(Math.round(coast * 1e6));
  });

  it('has 57 channels and says which', () => {
    expect(maritimeVhf.rows).toHaveLength(57);
    expect(describeKeys(maritimeVhf)).toBe('1 to 28 and 60 to 88');
    expect(view?.explainMiss(59)).toContain('Channel 59');
  });
});
