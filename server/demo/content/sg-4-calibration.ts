import { caution, foot, head, heading, note, paragraph, step, table, warning } from './blocks.ts';
import type { ManualPage } from './types.ts';

const calibration: ManualPage = {
  label: '3-1',
  blocks: [
    head('SG-4 SIGNAL GENERATOR'),
    heading(1, 'SECTION 3. CALIBRATION'),
    heading(2, '3.1 GENERAL'),
    paragraph(
      'Calibrate once in six months, and after V1, V2 or V4 is changed. Write down every reading as found before anything is touched.',
    ),
    heading(2, '3.2 CALIBRATOR CRYSTAL'),
    warning(
      'Trimmer C31 is reached through the hole beside the rectifier, where 180 volts are exposed. Use the long fibre tool and nothing else.',
    ),
    step('a.', 'Tune a receiver to a standard frequency transmission on 10.000 mc.'),
    step(
      'b.',
      'Lay a wire from the CAL jack close to the antenna lead of the receiver. Harmonic 10 of the calibrator will beat with the transmission.',
    ),
    step('c.', 'Turn C31 slowly for the lowest beat, less than 10 cps. The crystal is now at 1000 kc.'),
    heading(2, '3.3 SETTING A FREQUENCY'),
    paragraph('The example is for an output of 156.600 mc on band F.'),
    step('a.', 'Divide by 3. The oscillator must run at 52.200 mc.'),
    step('b.', 'Find the nearest mark below. It is number 52, at 52.000 mc.'),
    step(
      'c.',
      'Set BAND to E and CAL to ON. Turn the dial through 52.000 mc for zero beat in the phones. Set the hair line to the mark.',
    ),
    caution('Do not turn the hair line past its stops. The cord jumps its pulley.'),
    step('d.', 'Turn the dial up by 200 kc on the vernier scale.'),
    step('e.', 'Set BAND to F. The mark itself would come out at 156.000 mc, and the signal now stands above it.'),
    heading(2, '3.4 LIMITS'),
    step(
      'a.',
      'With a crystal at the limit of ±0.005 percent the mark is wrong by 2.6 kc, and the output on band F by 7.8 kc.',
    ),
    step('b.', 'Without the calibrator the dial may be wrong by 1 percent. At 52.200 mc that is 522 kc.'),
    note('For crystal controlled receivers set the last few kilocycles with a frequency counter at the output jack.'),
    foot('3-1'),
  ],
};

const ranges: ManualPage = {
  label: '3-2',
  blocks: [
    head('SG-4 SIGNAL GENERATOR'),
    heading(2, '3.5 TABLES'),
    table(
      { caption: 'Table 3-1. Frequency ranges', ruled: true },
      ['BAND', 'DIAL MC', 'OSCILLATOR MC', 'COIL', 'TRIPLER'],
      [
        ['A', '0.4 - 1.2', '0.4 - 1.2', 'L1', 'Out'],
        ['B', '1.2 - 3.7', '1.2 - 3.7', 'L2', 'Out'],
        ['C', '3.7 - 11', '3.7 - 11', 'L3', 'Out'],
        ['D', '11 - 33', '11 - 33', 'L4', 'Out'],
        ['E', '33 - 60', '33 - 60', 'L5', 'Out'],
        ['F', '99 - 170', '33 - 56.667', 'L5', 'In'],
      ],
    ),
    paragraph('Between 60 and 99 mc use the third harmonic of band D. The level is then not known.'),
    table(
      { caption: 'Table 3-2. Dial check, band E', ruled: true },
      ['MARK', 'DIAL MC', 'FOUND AT LEAST', 'FOUND AT MOST'],
      checkRows(),
    ),
    paragraph(
      'If a mark falls outside its limits, set trimmer C8 at the upper end and the core of L5 at the lower end, and go round once more.',
    ),
    note('The limits are 1 percent either side of the mark.'),
    foot('3-2'),
  ],
};

function checkRows(): string[][] {
  return [34, 37, 40, 43, 46, 49, 52, 55, 58].map((mark) => [
    String(mark),
    mark.toFixed(3),
    (mark * 0.99).toFixed(2),
    (mark * 1.01).toFixed(2),
  ]);
}

export const sg4Calibration = [calibration, ranges];
