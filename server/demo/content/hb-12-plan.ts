import type { FrequencyPlan } from '#shared/plan/plan.ts';

/** The signal chain of paragraphs 4.1 and 4.2 of the HB-12's manual, over the same quantities as its pages. */
export const hb12Plan: FrequencyPlan = {
  stages: [
    { id: 'antenna', kind: 'input', name: 'Antenna J1', from: [], frequency: 'carrier' },
    {
      id: 'rf',
      kind: 'filter',
      name: 'R-f amplifier V1',
      from: ['antenna'],
      limits: { low: '155.5 mc', high: '162.5 mc' },
    },
    { id: 'y1', kind: 'crystal', name: 'Oscillator V4, Y1', from: [], frequency: 'crystal', tolerance: '±0.002 %' },
    { id: 'tripler1', kind: 'multiplier', name: 'First tripler', from: ['y1'], factor: '3' },
    { id: 'tripler2', kind: 'multiplier', name: 'Second tripler V5', from: ['tripler1'], factor: '3' },
    {
      id: 'mixer1',
      kind: 'mixer',
      name: 'First mixer V2',
      from: ['rf', 'tripler2'],
      product: 'difference',
      injection: 'low',
    },
    {
      id: 'if1',
      kind: 'filter',
      name: 'First i-f V3',
      from: ['mixer1'],
      limits: { low: '10.6 mc', high: '10.8 mc' },
    },
    { id: 'y2', kind: 'crystal', name: 'Second oscillator, Y2', from: [], frequency: 'secondOscillator' },
    {
      id: 'mixer2',
      kind: 'mixer',
      name: 'Second mixer V6',
      from: ['if1', 'y2'],
      product: 'difference',
      injection: 'low',
      unit: 'kc',
    },
    {
      id: 'if2',
      kind: 'filter',
      name: 'Second i-f V7',
      from: ['mixer2'],
      limits: { low: '445 kc', high: '465 kc' },
      unit: 'kc',
    },
    { id: 'discriminator', kind: 'output', name: 'Discriminator V10', from: ['if2'], unit: 'kc' },
  ],
};
