import { caution, figure, foot, head, heading, note, paragraph, table, warning } from './blocks.ts';
import type { ManualPage } from './types.ts';

const cover: ManualPage = {
  label: 'Cover',
  blocks: [
    heading(2, 'TARNHOLT WORKS'),
    heading(1, 'HB-12 HARBOUR RECEIVER'),
    paragraph('SERVICE MANUAL'),
    figure('hb-12-front', 'Harbour Receiver HB-12, front view'),
    table(
      { caption: '', ruled: true },
      ['IDENTIFICATION', ''],
      [
        ['Equipment', 'Harbour Receiver HB-12, one channel, crystal controlled'],
        ['Serial numbers', '301 and above'],
        ['Document number', 'TW 112-3'],
        ['Edition', 'Second, August 1969. Replaces TW 112-2 of May 1966'],
        ['Printed for', 'Channel 12'],
      ],
    ),
    paragraph(
      "Sections 2, Installation, and 3, Operation, are issued apart as the Operator's Card, document number TW 112-1.",
    ),
  ],
};

const safety: ManualPage = {
  label: 'ii',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SAFETY SUMMARY'),
    paragraph('The warnings here are general. Others stand in the text, each before the step that it guards.'),
    warning(
      'DANGEROUS VOLTAGES ARE PRESENT INSIDE THE CASE. The plate supply is 250 volts d-c and the line voltage is present at the fuse and at the power switch. Remove the line plug before reaching into the chassis. Do not work alone.',
    ),
    warning(
      'STORED CHARGE. Filter capacitors C41 and C42 can hold a charge long after the line plug is removed, and resistor R38, which drains them, may be open. Discharge each capacitor to the chassis through a resistor of 1000 ohms, 10 watts, held with an insulated tool, and prove with a meter that no charge is left.',
    ),
    warning(
      'Rectifier CR1 is of selenium. A selenium rectifier that burns gives off poisonous fumes. Switch off, leave the room, and ventilate it.',
    ),
    caution(
      'Do not apply more than 0.1 volt of radio frequency to the antenna jack. The antenna coil will be burned out.',
    ),
    caution('The adjusting cores are brittle. Use the fibre tool supplied. Never turn a core against its stop.'),
    note(
      'The HB-12 is a receiver and radiates only by leakage. A signal generator or transmitter used with it is a source of radio waves. Transmitting, and the adjustment of transmitting gear, need a licence. Follow the local regulations and electrical codes, and leave such work to persons licensed for it. Nothing in this manual is an authority to transmit.',
    ),
    note(
      'A receiver that stands watch for distress calls must be tested and passed by a person entitled to do so before it goes back to service.',
    ),
    foot('ii'),
  ],
};

const general: ManualPage = {
  label: '1-1',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SECTION 1. GENERAL'),
    heading(2, '1.1 PURPOSE'),
    paragraph(
      'The HB-12 Harbour Receiver keeps a loudspeaker watch on one channel of the maritime band, 156 to 162 mc, with frequency modulation. It is intended for pilot stations, lock houses and harbour offices, and is left switched on day and night.',
    ),
    heading(2, '1.2 CHANNEL'),
    paragraph(
      'One crystal sets the channel. The receiver leaves the works adjusted for channel 12, 156.600 mc, and every frequency in this manual is given for that channel unless a table says otherwise. To set up another channel, see paragraph 5.7.',
    ),
    table(
      { caption: 'Table 1-1. Specifications', ruled: false },
      ['ITEM', 'RATING'],
      [
        ['Frequency range', '156.000 to 162.000 mc'],
        ['Channel spacing', '25 kc'],
        ['Type of circuit', 'Double conversion superheterodyne'],
        ['First intermediate frequency', '10.700 mc'],
        ['Second intermediate frequency', '455 kc'],
        ['Crystal multiplication', '9 times'],
        ['Crystal tolerance', '±0.002 percent'],
        ['Peak deviation', '5 kc'],
        ['Sensitivity', '0.6 µv for 20 db of quieting'],
        ['Selectivity', '70 db down at the next channel'],
        ['Image rejection', '60 db or better'],
        ['Spurious responses', '60 db down or better'],
        ['Squelch opens at', '0.3 µv'],
        ['Audio output', '2 watts into 3.2 ohms'],
        ['Audio distortion', 'Less than 8 percent at 1 watt'],
        ['Antenna input', '50 ohms, coaxial'],
        ['Power supply', '115 or 230 v a-c, 50 or 60 cps, 62 watts'],
        ['Temperature', '-10°C to +50°C'],
        ['Size', '17 x 7 x 11½ inches'],
        ['Weight', '24 pounds'],
      ],
    ),
    heading(2, '1.3 SUPPLIED'),
    paragraph(
      'With the receiver come one crystal in its holder, a fibre adjusting tool, two spare fuses of 1.5 amperes, and this manual.',
    ),
    foot('1-1'),
  ],
};

export const hb12Front = [cover, safety, general];
