import type { QuantityDefinition } from './quantity.ts';

/** The invented HB-12 harbour receiver at channel 12: low-side injection, a crystal of a ninth, double conversion. */
export const receiver: QuantityDefinition[] = [
  { symbol: 'channel', label: 'Channel', kind: 'input', unit: '', home: 12, integer: true, printed: { text: '12' } },
  {
    symbol: 'first_if',
    label: 'First IF',
    kind: 'input',
    unit: 'mc',
    home: '10.7 mc',
    printed: { text: '10.7 mc ± 5 kc' },
    tolerance: { kind: 'absolute', plus: 0.005, minus: 0.005 },
  },
  { symbol: 'second_if', label: 'Second IF', kind: 'constant', unit: 'kc', home: 455, printed: { text: '455 kc' } },
  { symbol: 'multiplier', label: 'Multiplication', kind: 'constant', unit: '', home: 9, integer: true },
  {
    symbol: 'carrier',
    label: 'Carrier',
    kind: 'derived',
    unit: 'mc',
    expression: 'lookup("maritime-vhf", channel, "ship")',
    printed: { text: '156.600 mc' },
  },
  {
    symbol: 'injection',
    label: 'Injection',
    kind: 'derived',
    unit: 'mc',
    expression: 'carrier - first_if',
    printed: { text: '145.900 mc' },
  },
  {
    symbol: 'crystal',
    label: 'Crystal',
    kind: 'derived',
    unit: 'mc',
    expression: 'injection / multiplier',
    printed: { text: '16.211111 mc' },
  },
  {
    symbol: 'image',
    label: 'Image',
    kind: 'derived',
    unit: 'mc',
    expression: 'carrier - 2 * first_if',
    printed: { text: '135.200 mc' },
  },
  {
    symbol: 'second_injection',
    label: 'Second injection',
    kind: 'derived',
    unit: 'MHz',
    expression: 'first_if - second_if',
  },
];
