import { lazyTable } from '../tables.ts';
import { numbersFrom } from './numbers.ts';

/**
 * Maritime VHF, ITU Radio Regulations, Appendix 18 (cited from memory; the values agree with 47 CFR 80.373(f), 2015, as far as
 * that was read, and with two published channel lists). The published rule, in kHz:
 * ship = 156000 + 50 n for n = 1 to 28, 156025 + 50 (n - 60) for n = 60 to 88; coast = ship + 4600 on duplex channels.
 */
const simplexChannels = new Set([
  6, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 67, 68, 69, 70, 71, 72, 73, 74, 75, 76, 77, 87, 88,
]);
const duplexSpacingKhz = 4600;

const shipKhz = (channel: number): number => (channel <= 28 ? 156_000 + 50 * channel : 156_025 + 50 * (channel - 60));
const coastKhz = (channel: number): number => shipKhz(channel) + (simplexChannels.has(channel) ? 0 : duplexSpacingKhz);

/** Whole kilohertz until the last division keep every megahertz value the nearest double to its printed digits. */
export const maritimeVhf = lazyTable(
  {
    id: 'maritime-vhf',
    title: 'VHF maritime mobile band',
    source: 'ITU Radio Regulations, Appendix 18; 47 CFR 80.373(f)',
    key: { name: 'channel', unit: '' },
    columns: [
      { name: 'ship', unit: 'MHz' },
      { name: 'coast', unit: 'MHz' },
    ],
  },
  () =>
    [...numbersFrom(1, 28), ...numbersFrom(60, 88)].map((channel) => [
      channel,
      shipKhz(channel) / 1000,
      coastKhz(channel) / 1000,
    ]),
);
