/**
 * Quantities as period manuals print them, each with what it is in SI's spelling. Period units: usage of parts lists up to
 * about 1965, common practice, no source; letter codes: IEC 60062; the arithmetic is the definition of the prefixes.
 */
// prettier-ignore
export const quantityTexts: readonly { text: string; si: string }[] = [
  { text: '2.2875 GHz', si: '2.2875 GHz' },
  { text: '455 kc', si: '455 kHz' },
  { text: '10.7 mc \u00B1 5 kc', si: '10.7 MHz \u00B1 5 kHz' },
  { text: '15 \u00B5\u00B5f', si: '15 pF' },
  { text: '.001 mfd', si: '1 nF' },
  { text: '2.2 meg', si: '2.2 M\u03A9' },
  { text: '4K7 5%', si: '4.7 k\u03A9 \u00B1 5 %' },
  { text: '\u00B10.005 percent', si: '0.005 %' },
  { text: '-107 dbm', si: '-107 dBm' },
  { text: '1,000 cps', si: '1.000 kHz' },
  { text: '0.5 \u00B5v/m', si: '0.5 \u00B5V/m' },
  { text: '6.3 v ac', si: '6.3 V' },
  { text: '3 to 5 ma', si: '3 to 5 mA' },
  { text: '10 x 10^-6', si: '0.000010' },
  { text: '2.5 \u00D7 10\u207B\u00B3 h', si: '' },
  { text: '2.5 x 10^-3 hy', si: '2.5 mH' },
  { text: '1.5e3 hz', si: '1.5 kHz' },
  { text: '+0.25 -0 mc', si: '0 to 250 kHz' },
  { text: '100 +20 -10 \u00B5f', si: '100 \u00B5F +20 \u221210 \u00B5F' },
  { text: '16.211111 mc \u00B1 20 ppm', si: '16.211111 MHz \u00B1 20 ppm' },
  { text: '40 mfd +30 -10 %', si: '40 \u00B5F +30 \u221210 %' },
  { text: '34 dB\u00B5V', si: '34 dB\u00B5V' },
  { text: '-60 dBc', si: '-60 dBc' },
  { text: '6 db', si: '6 dB' },
  { text: '+85 \u00B0C', si: '85 \u00B0C' },
  { text: '\u221240 \u00B0C', si: '-40 \u00B0C' },
  { text: '77 \u00B0F', si: '25 \u00B0C' },
  { text: '470R', si: '470 \u03A9' },
  { text: 'R47', si: '470 m\u03A9' },
  { text: '5 ppm', si: '5 ppm' },
  { text: '1/2', si: '' },
];

/** What recognition makes of them, and what was printed. The bends are those seen on generated scans. */
export const bentTexts: readonly { read: string; printed: string }[] = [
  { read: '455 ke', printed: '455 kc' },
  { read: 'l0.7 mc', printed: '10.7 mc' },
  { read: '15 uuf', printed: '15 uuf' },
  { read: '10.7 me', printed: '10.7 mc' },
  { read: '1OO kc', printed: '100 kc' },
  { read: '45S kc', printed: '455 kc' },
  { read: 'l56.6 rnc', printed: '156.6 mc' },
  { read: '2.2 rneg', printed: '2.2 meg' },
  { read: '.O01 mfd', printed: '.001 mfd' },
  { read: '47 kQ', printed: '47 k\u03A9' },
];
