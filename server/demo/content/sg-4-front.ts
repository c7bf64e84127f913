import { caution, figure, foot, head, heading, note, paragraph, step, table, warning } from './blocks.ts';
import type { ManualPage } from './types.ts';

const cover: ManualPage = {
  label: 'Cover',
  blocks: [
    heading(2, 'TARNHOLT WORKS'),
    heading(1, 'SG-4 SIGNAL GENERATOR'),
    paragraph('INSTRUCTION MANUAL'),
    figure('sg-4-front', 'Signal Generator SG-4, front view'),
    table(
      { caption: '', ruled: true },
      ['IDENTIFICATION', ''],
      [
        ['Equipment', 'Signal Generator SG-4'],
        ['Serial numbers', '1 to 640'],
        ['Document number', 'TW 204-1'],
        ['Edition', 'First, March 1964'],
        ['Companion sets', 'HB-10 and HB-12 harbour receivers'],
      ],
    ),
  ],
};

const general: ManualPage = {
  label: '1-1',
  blocks: [
    head('SG-4 SIGNAL GENERATOR'),
    heading(1, 'SECTION 1. GENERAL'),
    heading(2, '1.1 PURPOSE'),
    paragraph(
      'The SG-4 gives a known voltage at any frequency from 0.4 to 170 mc, plain or modulated, for the repair of radio receivers. A crystal calibrator of 1000 kc in the same case lets the dial be set closer than it can be read.',
    ),
    heading(2, '1.2 HOW IT WORKS'),
    paragraph(
      'Oscillator V1 covers bands A to E. On band F the oscillator runs at one third of the dial frequency and tripler V2 follows. Calibrator V4 makes a mark at every multiple of its crystal. The beat between a mark and the oscillator is heard at the PHONES jack.',
    ),
    figure('sg-4-chain', 'Figure 1-1. Block diagram'),
    table(
      { caption: 'Table 1-1. Specifications', ruled: false },
      ['ITEM', 'RATING'],
      [
        ['Frequency, six bands', '0.4 to 170 mc'],
        ['Dial accuracy', '1 percent'],
        ['Calibrator crystal', '1000 kc ±0.005 percent'],
        ['Output', '0.3 µv to 0.1 volt'],
        ['Output impedance', '50 Ω'],
        ['Amplitude modulation', '30 percent at 400 cps'],
        ['Frequency deviation', '0 to 15 kc, band F only'],
        ['Power supply', '115 or 230 v a-c, 48 watts'],
      ],
    ),
    heading(2, '1.3 SUPPLIED'),
    paragraph(
      'With the generator come an output cable of 50 Ω, a cap for the output jack, a long fibre tool, and two spare fuses of 1 ampere. The phones are not supplied. Any pair of 2000 Ω or more will do.',
    ),
    heading(2, '1.4 STORAGE'),
    paragraph(
      'Keep the generator dry and between 0°C and 45°C. If it has stood for more than a year, run it for a day before it is calibrated.',
    ),
    foot('1-1'),
  ],
};

const operation: ManualPage = {
  label: '2-1',
  blocks: [
    head('SG-4 SIGNAL GENERATOR'),
    heading(1, 'SECTION 2. OPERATION'),
    heading(2, '2.1 BEFORE SWITCHING ON'),
    warning(
      'The case must be joined to earth by the third wire of the line cord. Without it the case may carry half the line voltage, enough to kill.',
    ),
    step('a.', 'See that the slide at the rear shows the voltage of the line.'),
    step('b.', 'Turn ATTENUATOR to the left as far as it goes.'),
    step('c.', 'Plug in, switch on, and wait 20 minutes for the dial to settle.'),
    note(
      'The SG-4 is a source of radio waves. Never join it to an antenna. Where a test cannot be made inside a shielded room the local regulations apply, and a licence may be needed.',
    ),
    heading(2, '2.2 PLAIN SIGNAL'),
    step('a.', 'Set BAND to the band that holds the frequency wanted, Table 3-1.'),
    step('b.', 'Set the dial. For an error smaller than 1 percent use the calibrator as in paragraph 3.3.'),
    step('c.', 'Set CARRIER so that the meter is at the red line.'),
    caution(
      'Before the cable is joined to a receiver that can also transmit, make sure that it cannot be keyed. A transmitter burns out the attenuator.',
    ),
    step('d.', 'Join the cable to the receiver and turn ATTENUATOR up as needed.'),
    heading(2, '2.3 MODULATION'),
    step('a.', 'For amplitude modulation set MOD to AM. The depth is 30 percent.'),
    step('b.', 'For frequency modulation set BAND to F and MOD to FM.'),
    step('(1)', 'Feed 1000 cps, about 1 volt, into the AUDIO jack.'),
    step('(2)', 'Turn DEVIATION to the figure wanted, at most 15 kc.'),
    heading(2, '2.4 AFTER USE'),
    paragraph(
      'Turn ATTENUATOR to the left, switch off, and put the cap on the output jack. Moisture in the attenuator is the usual cause of a wrong reading below 10 µv.',
    ),
    foot('2-1'),
  ],
};

export const sg4Front = [cover, general, operation];
