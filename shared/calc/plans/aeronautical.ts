import { lazyTable } from '../tables.ts';
import { numbersFrom } from './numbers.ts';

const mhz = (name: string): { name: string; unit: string } => ({ name, unit: 'MHz' });

/**
 * A six-figure name is not a frequency: 118.000 and 118.005 are the same carrier with different spacing, and 118.030 is
 * 118.025 MHz. The carriers at 8.33 kHz are 25/3 kHz apart; 8.33 would leave the third 6.7 Hz low. Names in …20, …45, …70 and
 * …95 do not exist.
 */
const names = [
  { add: 0, thirds: 0, spacing: 25 },
  { add: 5, thirds: 0, spacing: 25 / 3 },
  { add: 10, thirds: 1, spacing: 25 / 3 },
  { add: 15, thirds: 2, spacing: 25 / 3 },
];
export const aeronauticalVhf = lazyTable(
  {
    id: 'aeronautical-vhf',
    title: 'Aeronautical mobile VHF, channel names',
    source: 'ICAO Annex 10 Volume V, table 4-1 (bis) (from memory; agrees with two open programs)',
    key: { name: 'channel name', unit: '' },
    columns: [mhz('carrier'), { name: 'spacing', unit: 'kHz' }],
  },
  () =>
    numbersFrom(0, 759).flatMap((step) => {
      const khz = 118_000 + 25 * step;
      return names.map(({ add, thirds, spacing }) => [(khz + add) / 1000, (3 * khz + 25 * thirds) / 3000, spacing]);
    }),
);

/** Glide paths for localizers 108.1, 108.3 … 111.9, in 10 kHz. No formula leads from one to the other: only this table. */
const glidePaths = [
  33470, 33410, 32990, 33050, 32930, 33140, 33200, 33260, 33320, 33380, 33440, 33500, 32960, 33020, 33080, 33170, 33230,
  33290, 33350, 33110,
];
/** 50 kHz above each localizer lies another, its glide path 150 kHz lower: the same table's own order. */
export const instrumentLanding = lazyTable(
  {
    id: 'ils',
    title: 'ILS localizers and glide paths',
    source: 'FAA Aeronautical Information Manual, table 1-1-4 (20 April 2023)',
    key: mhz('localizer'),
    columns: [mhz('glide path'), { name: 'DME channel', unit: '' }],
  },
  () =>
    glidePaths.flatMap((path, at) => {
      const localizer = 10_810 + 20 * at;
      return [
        [localizer / 100, path / 100, 18 + 2 * at],
        [(localizer + 5) / 100, (path - 15) / 100, 18 + 2 * at],
      ];
    }),
);

/** In 10 kHz, of an X channel; Y is 50 kHz above. Channels 1 to 16 and 60 to 69 only name a TACAN channel on a VHF selector. */
function pairedVhf(channel: number): number {
  if (channel <= 16) return 13_440 + 10 * (channel - 1);
  if (channel <= 59) return 10_800 + 10 * (channel - 17);
  return channel <= 69 ? 13_330 + 10 * (channel - 60) : 11_230 + 10 * (channel - 70);
}
const replyMhz = (channel: number, isX: boolean): number => channel + (channel <= 63 === isX ? 961 : 1087);

const distance = (letter: 'X' | 'Y') =>
  lazyTable(
    {
      id: `dme-${letter.toLowerCase()}`,
      title: `DME and TACAN, ${letter} channels`,
      source: 'ICAO Annex 10 Volume I, table A (from memory; pairs agree with a published formula)',
      key: { name: 'channel', unit: '' },
      columns: [mhz('interrogation'), mhz('reply'), mhz('VHF')],
    },
    () =>
      numbersFrom(1, 126).map((channel) => [
        channel,
        1024 + channel,
        replyMhz(channel, letter === 'X'),
        (pairedVhf(channel) + (letter === 'X' ? 0 : 5)) / 100,
      ]),
  );
export const distanceX = distance('X');
export const distanceY = distance('Y');
