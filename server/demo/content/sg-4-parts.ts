import { foot, head, heading, paragraph, partsRows, partsTable } from './blocks.ts';
import type { ManualPage } from './types.ts';

const rows = partsRows(`
  CAPACITORS
  C1 | Variable, main tuning, 11-410 µµf | 23-4110 | 1
  C3, C4 | Ceramic disc, .01 mfd, 500 v dcw | 21-3103 | 2
  C5 | Mica, 150 µµf ±5%, 500 v dcw | 22-1151 | 1
  C8 | Trimmer, band E, 1.5-7 µµf | 21-1107 | 1
  C12 | Mica, 22 µµf ±5%, 500 v dcw | 22-1220 | 1
  C17 | Paper, .1 mfd ±20%, 400 v dcw | 24-4104 | 1
  C24 | Feed-through, .001 mfd, 500 v dcw | 26-3102 | 6
  C27 | Mica, 100 µµf ±10%, 500 v dcw | 22-1101 | 1
  C31 | Variable air, calibrator, 3-15 µµf | 23-1015 | 1
  C36 | Electrolytic, 20 mfd, 350 v dcw | 25-3520 | 1
  RESISTORS
  R1 | Grid of V1, 22K ±10%, ½ watt | 41-5223 | 1
  R4 | Grid of V2, 33K ±10%, ½ watt | 41-5333 | 1
  R6 | Attenuator arm, 51 ohms ±1%, ½ watt | 45-0510 | 5
  R7 | Attenuator arm, 487 ohms ±1%, ½ watt | 45-4870 | 5
  R12 | Variable, CARRIER, 25K | 43-2253 | 1
  R15 | Grid of V4, 2.2 meg ±10%, ½ watt | 41-5225 | 1
  R20 | Bleeder, 100K ±10%, 1 watt | 41-6104 | 1
  COILS
  L1 | Band A, 390 µh | 32-0001 | 1
  L2 | Band B, 41 µh | 32-0002 | 1
  L3 | Band C, 4.4 µh | 32-0003 | 1
  L4 | Band D, .49 µh | 32-0004 | 1
  L5 | Bands E and F, .15 µh | 32-0005 | 1
  TUBES, CRYSTAL AND OTHER PARTS
  V1 | Triode, oscillator, 9-pin | 51-6104 | 1
  V2 | Pentode, tripler, 7-pin | 51-6206 | 1
  V3 | Pentode, modulator, 7-pin | 51-6206 | 1
  V4 | Triode-pentode, calibrator, 9-pin | 51-6210 | 1
  V5 | Pentode, beat mixer, 7-pin | 51-6207 | 1
  Y1 | Crystal, 1000 kc ±0.005% | 48-0100 | 1
  CR1 | Rectifier, selenium, 180 v, 60 ma | 52-1806 | 1
  T1 | Transformer, power, 115 and 230 v | 33-9004 | 1
  M1 | Meter, 200 µa | 65-0200 | 1
  F1 | Fuse, slow, 1 amp | 61-0100 | 1
`);

const parts: ManualPage = {
  label: '4-1',
  blocks: [
    head('SG-4 SIGNAL GENERATOR'),
    heading(1, 'SECTION 4. PARTS LIST'),
    paragraph('Parts that are not listed are of common make and may be had from any dealer.'),
    partsTable({
      caption: 'Table 4-1. Parts list',
      ruled: false,
      leaders: true,
      columns: [
        { heading: 'REF. DES.', meaning: 'refDes' },
        { heading: 'DESCRIPTION', meaning: 'description' },
        { heading: 'PART NO.', meaning: 'partNumber' },
        { heading: 'QTY', meaning: 'quantity' },
      ],
      rows,
    }),
    foot('4-1'),
  ],
};

export const sg4Parts = [parts];
