import { lazyTable } from '../tables.ts';
import { numbersFrom } from './numbers.ts';

export const fmBroadcast = lazyTable(
  {
    id: 'us-fm',
    title: 'US FM broadcasting, channels 200 to 300',
    source: '47 CFR 73.201 and 73.501',
    key: { name: 'channel', unit: '' },
    columns: [{ name: 'frequency', unit: 'MHz' }],
  },
  () => numbersFrom(200, 300).map((channel) => [channel, (879 + 2 * (channel - 200)) / 10]),
);

/** Between 4 and 5 there is a gap of 4 MHz; 37 is kept for radio astronomy and carries no station. */
function lowerEdgeMhz(channel: number): number {
  if (channel <= 4) return 54 + 6 * (channel - 2);
  if (channel <= 6) return 76 + 6 * (channel - 5);
  return channel <= 13 ? 174 + 6 * (channel - 7) : 470 + 6 * (channel - 14);
}

/** Analogue carriers: vision 1.25 MHz above the lower edge, sound 4.5 MHz above vision; the oscillator for a picture IF of 45.75 MHz. */
export const television = lazyTable(
  {
    id: 'us-tv',
    title: 'US television, channels 2 to 69, analogue carriers',
    source: '47 CFR 73.603(a) and 73.682(a)',
    key: { name: 'channel', unit: '' },
    columns: ['lower', 'upper', 'visual', 'aural', 'oscillator'].map((name) => ({ name, unit: 'MHz' })),
  },
  () =>
    numbersFrom(2, 69).map((channel) => {
      const lower = lowerEdgeMhz(channel);
      return [channel, lower, lower + 6, lower + 1.25, lower + 5.75, lower + 47];
    }),
);
