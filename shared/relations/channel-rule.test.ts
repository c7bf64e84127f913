import { describe, expect, it } from 'vitest';
import { maritimeVhf } from '#shared/calc/plans/maritime.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { compile } from '#shared/calc/program.ts';
import { findChannelRule } from './channel-rule.ts';

/** 47 CFR 95.407 (2015): the 40 channels of the US citizens band, in MHz. */
const citizensBand = [
  26.965, 26.975, 26.985, 27.005, 27.015, 27.025, 27.035, 27.055, 27.065, 27.075, 27.085, 27.105, 27.115, 27.125,
  27.135, 27.155, 27.165, 27.175, 27.185, 27.205, 27.215, 27.225, 27.255, 27.235, 27.245, 27.265, 27.275, 27.285,
  27.295, 27.305, 27.315, 27.325, 27.335, 27.345, 27.355, 27.365, 27.375, 27.385, 27.395, 27.405,
];
const rowsOf = (mhz: readonly number[]) =>
  mhz.map((each, at) => ({ channel: at + 1, hz: Math.round(each * 1e6), grain: 1000 }));

describe('the rule of a channel table', () => {
  it('is found for the maritime band', () => {
    // ITU Radio Regulations, Appendix 18: 156.05 + 0.05 (n - 1) to channel 28, 156.025 + 0.05 (n - 60) from 60.
    const rows = maritimeVhf.rows.map(([channel = NaN, ship = NaN]) => ({
      channel,
      hz: Math.round(ship * 1e6),
      grain: 1000,
    }));
    const rule = findChannelRule(rows);
    expect(rule).toMatchObject({
      exceptions: [],
      expression: 'channel <= 28 ? 156.05 MHz + 50 kHz * (channel - 1) : (156.025 MHz + 50 kHz * (channel - 60))',
      says: 'Channels 1 to 28 lie 50 kHz apart up from 156.05 MHz, and channels 60 to 88 lie 50 kHz apart up from 156.025 MHz. That gives all 57 rows.',
    });
    const program = compile([
      { symbol: 'channel', label: '', kind: 'input', unit: '', home: 1 },
      { symbol: 'ship', label: '', kind: 'derived', unit: 'MHz', expression: rule?.expression ?? '' },
    ]);
    for (const { channel, hz } of rows)
      expect(Math.round((evaluate(program, { channel }).values['ship']?.value ?? NaN) * 1e6)).toBe(hz);
  });

  it('comes in pieces where a band has gaps, with the odd channel by itself', () => {
    const rule = findChannelRule(rowsOf(citizensBand));
    expect(rule?.pieces.every(({ step }) => step === 10_000)).toBe(true);
    // Channel 23 lies above 24 and 25 (47 CFR 95.407).
    expect(rule?.exceptions.map(({ channel }) => channel)).toEqual([23, 24, 25]);
  });

  it('points at a misprint and says what the rule would have there', () => {
    // A public table prints channel 32 as 27.225; 47 CFR 95.407 has 27.325.
    const rule = findChannelRule(rowsOf(citizensBand.with(31, 27.225)));
    expect(rule?.exceptions).toContainEqual({ channel: 32, hz: 27_225_000, rule: 27_325_000 });
  });

  it('is not found where there is none', () => {
    expect(findChannelRule(rowsOf([1.1, 5.7, 2.9, 8.8]))).toBeUndefined();
    expect(findChannelRule([])).toBeUndefined();
  });
});
