import { foot, head, heading, paragraph, partsRows, partsTable } from './blocks.ts';
import type { ManualPage } from './types.ts';

const capacitorsAndCoils = partsRows(`
  CAPACITORS
  C1 | Ceramic, antenna trimmer | 1.5-7 µµf | 21-1107 | 1
  C2 | Ceramic, tubular NPO | 4.7 µµf ±0.5 µµf | 21-2047 | 1
  C3, C6, C9 | Ceramic disc, 500 v dcw | .001 mfd ±20% | 21-3102 | 3
  C4 | Ceramic, tubular N750 | 10 µµf ±5% | 21-2100 | 1
  C5 | Mica, 500 v dcw | 47 µµf ±10% | 22-1470 | 1
  C7 | Mica, 500 v dcw | 100 µµf ±10% | 22-1101 | 1
  C8 | Ceramic, tubular NPO | 2.2 µµf ±0.25 µµf | 21-2022 | 1
  C10 | Mica, 500 v dcw | 220 µµf ±5% | 22-1221 | 1
  C11, C12 | Ceramic disc, 500 v dcw | .0047 mfd ±20% | 21-3472 | 2
  C14 | Mica, 300 v dcw | 470 µµf ±5% | 22-1471 | 1
  C16 | Ceramic disc, 500 v dcw | .01 mfd +80 -20% | 21-3103 | 1
  C18 | Mica, 500 v dcw | 33 µµf ±5% | 22-1330 | 1
  C20 | Variable air, crystal trimmer, slotted shaft | 3-15 µµf | 23-1015 | 1
  C22 | Mica, 500 v dcw | 68 µµf ±5% | 22-1680 | 1
  C24 | Paper, 400 v dcw | .022 mfd ±20% | 24-4223 | 1
  C28 | Paper, 400 v dcw | .1 mfd ±20% | 24-4104 | 1
  C33 | Paper, 200 v dcw | .47 mfd ±20% | 24-2474 | 1
  C38 | Electrolytic, 25 v dcw | 25 mfd +100 -10% | 25-0250 | 1
  C41, C42 | Electrolytic, twin section, 450 v dcw | 40 mfd +50 -10% | 25-4540 | 1
  COILS
  L1 | Antenna, with core | .09-.14 µh | 31-1201 | 1
  L2, L3 | R-f, with core | .10-.16 µh | 31-1202 | 2
  L4 | Choke, r-f | 2.2 µh ±10% | 31-0022 | 1
  L5 | First tripler plate, with core | .8-1.3 µh | 31-1205 | 1
  L6, L7 | Second tripler, with core | .07-.11 µh | 31-1206 | 2
  L8 | Choke, r-f | 1 mh ±10% | 31-0102 | 1
  L9 | Choke, filter, 90 ma | 8 h | 31-9080 | 1
`);

const resistorsAndTubes = partsRows(`
  RESISTORS, ½ watt composition, ±10% unless stated
  R1 | 41-5470 | Cathode of V1, 47 ohms | 1
  R2, R9 | 41-5104 | Grid, 100K | 2
  R3, R4 | 41-5102 | Screen of V1, plate of V2, 1000 ohms | 2
  R5 | 41-5473 | Grid of V4, 47K | 1
  R6 | 41-5472 | Plate of V4, 4.7K | 1
  R7 | 41-5474 | Grid of V5, 470K | 1
  R8, R14 | 41-6223 | Screen, 22K, 1 watt | 2
  R11 | 41-5105 | Metering at TP3, 1 meg | 1
  R15 | 41-5225 | Limiter grid, 2.2 meg | 1
  R18, R19 | 42-2104 | Discriminator, matched pair, 100K ±5% | 2
  R22 | 41-5684 | De-emphasis, 680K | 1
  R26 | 43-2504 | Variable, volume, .5 meg, with switch | 1
  R29 | 43-1103 | Variable, squelch, 10K | 1
  R34 | 44-5271 | Cathode of V12, 270 ohms, 2 watts | 1
  R38 | 44-6154 | Bleeder, 150K, 2 watts | 1
  TUBES AND RECTIFIER
  V1, V3 | 51-6206 | Pentode, r-f, 7-pin | 2
  V2, V6 | 51-6207 | Pentode, mixer, 7-pin | 2
  V4, V5 | 51-6210 | Triode-pentode, 9-pin | 2
  V7, V8, V9 | 51-6212 | Pentode, i-f and limiter, 7-pin | 3
  V10 | 51-6305 | Twin diode, discriminator | 1
  V11 | 51-6307 | Twin triode, audio and squelch | 1
  V12 | 51-6409 | Power pentode, audio output | 1
  CR1 | 52-2508 | Selenium, bridge, 250 v, 100 ma | 1
  CRYSTALS
  Y1 | 48-1612 | Channel 12, 16.211111 mc, ±0.002% | 1
  Y2 | 48-1024 | Second oscillator, 10.245 mc, ±0.005% | 1
  TRANSFORMERS
  T1, T2 | 33-1070 | First i-f, 10.700 mc | 2
  T3, T4 | 33-0455 | Second i-f, 455 kc | 2
  T5 | 33-0456 | Discriminator, 455 kc | 1
  T6 | 33-9002 | Audio output, 5000 ohms to 3.2 ohms | 1
  T7 | 33-9012 | Power, 115 and 230 v, 50 or 60 cps | 1
  MISCELLANEOUS
  F1 | 61-0150 | Fuse, slow, 1.5 amp | 1
  J1 | 62-0050 | Jack, coaxial, antenna, 50 ohms | 1
  LS1 | 63-0532 | Loudspeaker, 5 inch, 3.2 ohms | 1
  S1 | 64-0101 | Switch, power, on R26 | REF
`);

const ruledPage: ManualPage = {
  label: '6-1',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SECTION 6. PARTS LIST'),
    paragraph(
      'Order by part number, with the model and serial number of the set. Capacitors are 500 v dcw unless stated.',
    ),
    partsTable({
      caption: 'Table 6-1. Capacitors and coils',
      ruled: true,
      leaders: false,
      columns: [
        { heading: 'REF. DES.', meaning: 'refDes' },
        { heading: 'DESCRIPTION', meaning: 'description' },
        { heading: 'VALUE', meaning: 'value' },
        { heading: 'PART NO.', meaning: 'partNumber' },
        { heading: 'QTY', meaning: 'quantity' },
      ],
      rows: capacitorsAndCoils,
    }),
    foot('6-1'),
  ],
};

const unruledPage: ManualPage = {
  label: '6-2',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    partsTable({
      caption: 'Table 6-2. Resistors, tubes, crystals and other parts',
      ruled: false,
      leaders: false,
      columns: [
        { heading: 'REF. DES.', meaning: 'refDes' },
        { heading: 'PART NO.', meaning: 'partNumber' },
        { heading: 'DESCRIPTION', meaning: 'description' },
        { heading: 'QTY', meaning: 'quantity' },
      ],
      rows: resistorsAndTubes,
    }),
    foot('6-2'),
  ],
};

export const hb12Parts = [ruledPage, unruledPage];
