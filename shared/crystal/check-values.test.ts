import { describe, expect, it } from 'vitest';
import { blankThickness, frequencyConstants } from './blank.ts';
import { deviationPpm, errorBudget, ppmToHz } from './budget.ts';
import {
  capacitorReactance,
  driveOfCurrent,
  driveOfVoltage,
  idealCapacitanceRatio,
  loadOffsetPpm,
  loadResonance,
  loadResonanceApproximately,
  parallelResonance,
  pullingPpm,
  qualityFactor,
  resistanceAtLoad,
  seriesResonance,
  trimSensitivity,
} from './model.ts';
import { motionalInductance, staticCapacitance } from './motional.ts';
import { capacitorsForLoad, criticalTransconductance, loadOfTwoCapacitors } from './oscillator.ts';

const mil = 25.4e-6;
const maker = 66.666e6 * mil;
const vig = { c1: 14e-15, c0: 5e-12 };
const twenty = { c1: 20e-15, c0: 5e-12 };
const resonator = { fs: 10e6, ...vig };
const sedra = { l1: 0.52, c1: 0.012e-12, c0: 4e-12 };
const vtu = { l1: 0.334, c1: 0.065e-12, c0: 1e-12 };
const measured = { series: 9_996_490, parallel: 10_017_730 };

/** Value, what it must be, within what; printed values within half their last digit, derived ones to double precision. */
type Check = [name: string, value: number, expected: number, within: number];

// prettier-ignore
const checks: Check[] = [
  // aextal.com tutorial "Frequency": 66.666 MHz mil, three worked thicknesses; the first is printed cut off, not rounded.
  ['thickness of 4.9152 MHz, mil', blankThickness(4.9152e6, 1, maker) / mil, 13.5, 0.07],
  ['thickness of 25 MHz, mil', blankThickness(25e6, 1, maker) / mil, 2.7, 0.05],
  ['thickness of 75 MHz third overtone, mil', blankThickness(75e6, 3, maker) / mil, 2.7, 0.05],
  ['its coefficient in Hz m', frequencyConstants.high, 1693, 1],
  // calcrystal.com "Crystals": overtones of 15 MHz nominally at 45, 75, 105, 135, 165 MHz: one blank.
  ...[45, 75, 105, 135, 165].map((mhz, at): Check => [`blank of ${mhz} MHz`, blankThickness(mhz * 1e6, 3 + 2 * at, maker), blankThickness(15e6, 1, maker), 1e-18]),
  // Electronics Q&A site, question 566036: two 33 pF, 4 pF pins, 2 pF stray.
  ['load of two 33 pF, F', loadOfTwoCapacitors(37e-12, 37e-12, 2e-12), 20.5e-12, 1e-15],
  // Public board-design notebook applying AN2867; Petermann-Technik "Quartz frequency pull".
  ['capacitors for 9 pF, F', capacitorsForLoad(9e-12, 4e-12), 1e-11, 1e-16],
  // ST AN2867 p. 13 as quoted in the maker's forum; values of the board-design notebook.
  ['critical gm, A/V', criticalTransconductance({ esr: 80, hz: 16e6, c0: 7e-12, load: 9e-12 }), 0.0008279224243581338, 1e-15],
  ['gain margin', 0.017 / criticalTransconductance({ esr: 80, hz: 16e6, c0: 7e-12, load: 9e-12 }), 20.533324741360456, 1e-9],
  ['reactance of 8 pF at 16 MHz, ohm', -capacitorReactance(16e6, 8e-12), 1243.3979929054324, 1e-6],
  ['critical gm with 100 ohm, A/V', criticalTransconductance({ esr: 180, hz: 16e6, c0: 7e-12, load: 9e-12 }), 0.0018628254548058012, 1e-15],
  ['gain margin with 100 ohm', 0.017 / criticalTransconductance({ esr: 180, hz: 16e6, c0: 7e-12, load: 9e-12 }), 9.125922107271313, 1e-9],
  // ST AN2867, worked example, from memory.
  ['critical gm at 8 MHz, A/V', criticalTransconductance({ esr: 80, hz: 8e6, c0: 7e-12, load: 10e-12 }), 0.00023, 5e-6],
  ['gain margin at 8 MHz', 0.025 / criticalTransconductance({ esr: 80, hz: 8e6, c0: 7e-12, load: 10e-12 }), 107, 0.5],
  // Circuit Cellar "Test Your EQ" no. 67: the data were read, the printed answer was not; values by the formulas.
  ['C0 from fs, fp, C1, F', staticCapacitance(0.0271e-12, measured), 6.370465688055062e-12, 1e-25],
  ['L1 from fs, C1, H', motionalInductance(9_996_490, 0.0271e-12), 0.009353537691826732, 1e-14],
  // Sedra & Smith, Microelectronic Circuits, exercise, from memory.
  ['series resonance, Hz', seriesResonance(sedra), 2.015e6, 500],
  ['parallel resonance, Hz', parallelResonance(sedra), 2.018e6, 500],
  ['Q', qualityFactor({ l1: 0.52, r1: 120 }, 2_014_774.1), 55_000, 200],
  // Textbook problem, from memory.
  ['series resonance of 0.334 H, Hz', seriesResonance(vtu), 1.08e6, 5000],
  ['parallel resonance of 0.334 H, Hz', parallelResonance(vtu), 1.115e6, 1000],
  ['Q of 0.334 H', qualityFactor({ l1: 0.334, r1: 5500 }, 1_080_166.8), 412, 0.5],
  // A calculator page prints 2.05 MHz for these; the law gives 6.497 MHz.
  ['series resonance of 0.02 H, 0.03 pF', seriesResonance({ l1: 0.02, c1: 0.03e-12 }), 6_497_473.343613968, 1e-6],
  // J. R. Vig tutorial, "Effect of load capacitance on stability", from memory: about 1e-7 and 2e-9.
  ['10 fF more load, ppm', pullingPpm(vig, 20e-12, 20.01e-12), -0.1, 0.02],
  ['10 ppm more load, ppm', pullingPpm(vig, 20e-12, 20.0002e-12), -0.002, 0.0003],
  // Petermann-Technik "Quartz frequency pull": the formulas; values derived.
  ['trim sensitivity, ppm/pF', trimSensitivity(vig, 20e-12), -11.2, 1e-9],
  ['load offset, ppm', loadOffsetPpm(vig, 20e-12), 280, 1e-9],
  ['a 32 pF unit with 20 pF, ppm', pullingPpm(twenty, 32e-12, 20e-12), 129.72972972972974, 1e-9],
  // Abracon/Fox as quoted on a maker forum: an overtone pulls by 1/n^2; value derived.
  ['the same as third overtone, ppm', pullingPpm({ ...twenty, c1: twenty.c1 / 9 }, 32e-12, 20e-12), 14.414414414414416, 1e-9],
  // Textbook laws; values derived.
  ['fL exact, Hz', loadResonance(resonator, 20e-12), 10_002_799.60810972, 1e-6],
  ['fL approximate, Hz', loadResonanceApproximately(resonator, 20e-12), 10_002_800, 1e-6],
  ['series instead of 32 pF, ppm', loadOffsetPpm(twenty, 32e-12), 270.2702702702703, 1e-9],
  ['reactance of 20 pF at 10 MHz, ohm', capacitorReactance(10e6, 20e-12), -795.7747154594767, 1e-9],
  ['L1 of 10 MHz, 14 fF, H', motionalInductance(10e6, 14e-15), 0.018093068507560314, 1e-15],
  ['Q of 10 MHz, 14 fF, 20 ohm', qualityFactor({ l1: motionalInductance(10e6, 14e-15), r1: 20 }, 10e6), 56_841.051104248334, 1e-6],
  ['tuning fork offset, ppm', loadOffsetPpm({ c1: 1.25e-15, c0: 1.75e-12 }, 12.5e-12), 43.85964912280702, 1e-9],
  // Taitien technical FAQ and AN2867 p. 15: RL = R1 (1 + C0/CL)^2, drive I^2 RL; values derived.
  ['resistance at load, ohm', resistanceAtLoad({ r1: 20, c0: 5e-12 }, 20e-12), 31.25, 1e-12],
  ['drive of 1 mA, W', driveOfCurrent(1e-3, 31.25), 31.25e-6, 1e-18],
  ['drive of 0.2 V, W', driveOfVoltage({ r1: 40, c0: 5e-12 }, { volts: 0.2, hz: 10e6, load: 20e-12 }), 3.947841760435743e-6, 1e-18],
  // Parts per million: definition.
  ['0.005 % of 7 MHz, Hz', ppmToHz(7e6, 50), 350, 1e-9],
  ['9 999 850 Hz of 10 MHz, ppm', deviationPpm(9_999_850, 10e6), -15, 1e-9],
  ['worst case of 10, 15, 5, ppm', errorBudget([10, 15, 5].map((ppm) => ({ part: 'other', ppm }))).worstPpm, 30, 0],
  ['root sum square, ppm', errorBudget([10, 15, 5].map((ppm) => ({ part: 'other', ppm }))).rssPpm, 18.708286933869708, 1e-12],
  // J. R. Vig tutorial, slide 3-25: k = 8.8 %; the formula from memory.
  ['ideal C0/C1', idealCapacitanceRatio(1), 159.31050492460872, 1e-10],
  ['ideal C0/C1, third overtone', idealCapacitanceRatio(3), 1433.7945443214785, 1e-9],
];

describe('published and derived values of crystals', () => {
  it.each(checks)('%s', (_, value, expected, within) => {
    expect(Math.abs(value - expected)).toBeLessThanOrEqual(within);
  });
});
