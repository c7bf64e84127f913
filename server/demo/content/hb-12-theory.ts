import { figure, foot, head, heading, paragraph } from './blocks.ts';
import type { ManualPage } from './types.ts';

const theory: ManualPage = {
  label: '4-1',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SECTION 4. THEORY OF OPERATION'),
    heading(2, '4.1 SIGNAL PATH'),
    paragraph(
      'The signal at 156.600 mc passes from antenna jack J1 through coils L1 and L2 to r-f amplifier V1 and on to first mixer V2. There it meets the injection at 145.900 mc, which lies below the signal. The difference, 10.700 mc, is amplified by V3. In second mixer V6 it beats with a crystal oscillator at 10.245 mc, and the difference of 455 kc passes through V7 to limiters V8 and V9 and discriminator V10. The audio reaches the loudspeaker by way of V11 and V12.',
    ),
    figure('hb-12-chain', 'Figure 4-1. Chain of frequencies, channel 12'),
    heading(2, '4.2 INJECTION CHAIN'),
    paragraph(
      'Oscillator V4 holds crystal Y1 at 16.211111 mc. Its plate circuit, the first tripler, is tuned to the third harmonic, 48.633 mc. V5 triples again and feeds the mixer with 9 times the crystal frequency.',
    ),
    heading(2, '4.3 UNWANTED RESPONSES'),
    paragraph(
      'A signal as far below the injection as the wanted one is above it would also give the first intermediate frequency. For channel 12 this image lies at 135.200 mc. The second mixer has an image of its own at 9.790 mc, which transformers T1 and T2 keep out.',
    ),
    heading(2, '4.4 LIMITERS AND SQUELCH'),
    paragraph(
      'V8 and V9 draw grid current on any signal of more than 0.5 µv, and so take off what amplitude modulation there is. The grid voltage of V8 can be read at TP4. With no signal, noise from the discriminator is rectified in V11 and biases the audio stage off.',
    ),
    foot('4-1'),
  ],
};

const schematic: ManualPage = {
  label: '7-1',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(1, 'SECTION 7. DIAGRAMS'),
    figure('hb-12-injection', 'Figure 7-1. Injection chain and first mixer, schematic diagram'),
    heading(3, 'NOTES'),
    paragraph('1. Unless marked otherwise, resistors are in ohms and ½ watt, capacitors in µµf.'),
    paragraph(
      '2. Voltages are to the chassis, no signal, with a meter of 20,000 ohms per volt, and may vary ±10 percent.',
    ),
    paragraph('3. K is 1000 ohms, meg is 1,000,000 ohms. Heaters, and coil L7, coupled to L6, are not shown.'),
    foot('7-1'),
  ],
};

export const hb12Theory = [theory];
export const hb12Diagrams = [schematic];
