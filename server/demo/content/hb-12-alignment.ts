import { caution, foot, head, heading, note, paragraph, step, warning } from './blocks.ts';
import type { ManualPage } from './types.ts';

const injectionChain: ManualPage = {
  label: '5-1',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SECTION 5. ALIGNMENT'),
    heading(2, '5.1 GENERAL'),
    paragraph(
      'The figures are for channel 12. Needed are a signal generator of 50 ohms such as the SG-4, a frequency counter good to ±0.0005 percent, and a vacuum tube voltmeter. Let all warm up for 30 minutes.',
    ),
    heading(2, '5.2 INJECTION CHAIN'),
    warning(
      'The plate supply is 250 volts. With the case off, line voltage is exposed at the fuse. Keep one hand away from the chassis.',
    ),
    step('a.', 'Connect the voltmeter to test point TP3, grid of V5.'),
    step(
      'b.',
      'Tune L5 for the greatest reading. The circuit is now at 48.633 mc. The reading must be 2.5 volts or more.',
    ),
    step(
      'c.',
      'Move the voltmeter to TP2, grid of first mixer V2. Tune L6, then L7, for the greatest reading at 145.900 mc.',
    ),
    caution(
      'L6 can also be tuned to twice the grid frequency. If the core is nearly all the way in, back it out and begin again.',
    ),
    step('d.', 'Couple the counter loosely to L7. Set trimmer C20 as follows.'),
    step('(1)', 'Adjust C20 until the counter shows 145.900 mc.'),
    step(
      '(2)',
      'If it cannot be reached, the crystal is at fault. It must be 16.211111 mc ±0.002 percent in its holder.',
    ),
    step('(3)', 'The limits at the mixer are 145.897 mc and 145.903 mc, that is 2.9 kc either side.'),
    heading(2, '5.3 SECOND I-F AND DISCRIMINATOR'),
    step(
      'a.',
      'Remove Y1. Connect the generator through .01 mfd to the grid of V6. Set it to 10.700 mc without modulation.',
    ),
    step('b.', 'Check that second oscillator crystal Y2 runs at 10.245 mc ±0.005 percent.'),
    step(
      'c.',
      'Connect the voltmeter to TP4, first limiter grid. Tune T3 and T4 for the greatest reading at 455 kc. Lower the generator so that the reading stays below 1 volt.',
    ),
    step('d.', 'Move the voltmeter to TP5. Tune the upper core of T5 for zero between a positive and a negative peak.'),
    foot('5-1'),
  ],
};

const radioFrequency: ManualPage = {
  label: '5-2',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(2, '5.4 FIRST I-F'),
    step(
      'a.',
      'Connect the generator to the grid of V2 at 10.700 mc. With the voltmeter at TP4 tune T1 and T2 for the greatest reading.',
    ),
    step('b.', 'Set the generator to 9.790 mc. The level for an equal reading must be 1000 times as great, or more.'),
    heading(2, '5.5 R-F STAGES'),
    warning(
      'Switch off, remove the line plug, and discharge C41 and C42 before Y1 is put back. The crystal socket is next to the plate supply.',
    ),
    step('a.', 'Put back Y1. Connect the generator to J1, set to 156.600 mc.'),
    step(
      'b.',
      'Tune L1, L2 and L3 for the greatest reading at TP4, lowering the generator to stay in the range below 1 volt.',
    ),
    step(
      'c.',
      'Modulate the generator with 1000 cps at a deviation of 3.3 kc. Adjust the lower core of T5 for least distortion.',
    ),
    step('d.', 'Raise the deviation to 5 kc. No roughness may be heard.'),
    note('Two thirds of the peak deviation is the standard test.'),
    heading(2, '5.6 PERFORMANCE CHECK'),
    step('a.', 'Sensitivity. At 156.600 mc not more than 0.6 µv may be needed for 20 db of quieting.'),
    step(
      'b.',
      'Selectivity. Repeat at 156.575 mc and at 156.625 mc, one channel spacing of 25 kc below and above. Each must need 70 db more.',
    ),
    step('c.', 'Image. Repeat at 135.200 mc. It must need 60 db more.'),
    step('d.', 'Squelch. The loudspeaker must open at 0.3 µv, and close when the generator is switched off.'),
    heading(2, '5.7 CHANGE OF CHANNEL'),
    paragraph(
      'Take the crystal frequency from Table 5-1, or subtract the first intermediate frequency from the channel frequency and divide by 9. Order the crystal for parallel resonance with 32 µµf. Then repeat paragraphs 5.2, 5.5 and 5.6.',
    ),
    caution(
      'Do not leave the old crystal in the case as a spare. A set put back to service on the wrong channel keeps no watch.',
    ),
    foot('5-2'),
  ],
};

export const hb12Alignment = [injectionChain, radioFrequency];
