import { lazyTable } from '../tables.ts';
import { numbersFrom } from './numbers.ts';

const channel = { name: 'channel', unit: '' };
const frequency = { name: 'frequency', unit: 'MHz' };

/**
 * No formula: the raster of 10 kHz from 26.965 to 27.405 MHz without five places, rising but for channels 23, 24 and 25.
 * A public table prints channel 32 as 27.225, which is channel 22.
 */
const cbGapsKhz = new Set([26_995, 27_045, 27_095, 27_145, 27_195]);
export const citizensBand = lazyTable(
  {
    id: 'us-cb',
    title: 'US Citizens Band, 40 channels',
    source: '47 CFR 95.407(a), editions of 1997, 2014 and 2016; now 95.963',
    key: channel,
    columns: [frequency],
  },
  () => {
    const raster = numbersFrom(0, 44)
      .map((step) => 26_965 + 10 * step)
      .filter((khz) => !cbGapsKhz.has(khz));
    const [at23, at24, at25] = [raster[22] ?? 0, raster[23] ?? 0, raster[24] ?? 0];
    raster.splice(22, 3, at25, at23, at24);
    return raster.map((khz, at) => [at + 1, khz / 1000]);
  },
);

/** In units of 100 Hz: 462.5625 MHz has half a kilohertz. */
function frsTenthsKhz(number: number): number {
  if (number <= 7) return 4_625_625 + 250 * (number - 1);
  if (number <= 14) return 4_675_625 + 250 * (number - 8);
  return 4_625_500 + 250 * (number - 15);
}
export const familyRadio = lazyTable(
  {
    id: 'us-frs-gmrs',
    title: 'US FRS and GMRS, channels 1 to 22',
    source: '47 CFR 95.29 (2015); 47 CFR 95.563 and 95.1763 (after 2017, from memory)',
    key: channel,
    columns: [frequency],
  },
  () => numbersFrom(1, 22).map((number) => [number, frsTenthsKhz(number) / 10_000]),
);
/** Only these eight have a repeater: the others must not show an input. */
export const generalMobileRepeaters = lazyTable(
  {
    id: 'us-gmrs-repeaters',
    title: 'US GMRS repeaters',
    source: '47 CFR 95.29 (2015)',
    key: channel,
    columns: [
      { name: 'output', unit: 'MHz' },
      { name: 'input', unit: 'MHz' },
    ],
  },
  () =>
    numbersFrom(15, 22).map((number) => [
      number,
      frsTenthsKhz(number) / 10_000,
      (frsTenthsKhz(number) + 50_000) / 10_000,
    ]),
);

export const multiUse = lazyTable(
  {
    id: 'us-murs',
    title: 'US MURS',
    source: '47 CFR 95.632 (2015)',
    key: channel,
    columns: [frequency, { name: 'bandwidth', unit: 'kHz' }],
  },
  () => [
    [1, 151.82, 11.25],
    [2, 151.88, 11.25],
    [3, 151.94, 11.25],
    [4, 154.57, 20],
    [5, 154.6, 20],
  ],
);

/** The numbers do not follow the frequencies. Seven there are: lists with WX8 to WX10 add what is no weather channel of NOAA. */
const weatherKhz = [162_550, 162_400, 162_475, 162_425, 162_450, 162_500, 162_525];
export const weatherRadio = lazyTable(
  {
    id: 'us-weather',
    title: 'NOAA Weather Radio, WX1 to WX7',
    source: 'NOAA Weather Radio channel list (secondary); NWS (from memory)',
    key: { name: 'WX', unit: '' },
    columns: [frequency],
  },
  () => weatherKhz.map((khz, at) => [at + 1, khz / 1000]),
);

/** Dial settings are for upper sideband, 1.5 kHz below the middle of the channel. */
const dialBelowCentreKhz = 1.5;
export const amateurSixtyMetres = lazyTable(
  {
    id: 'us-60m',
    title: 'US amateur 60 m channels',
    source: '47 CFR 97.303(h), from memory; the centre frequencies agree with a published list',
    key: channel,
    columns: [
      { name: 'centre', unit: 'kHz' },
      { name: 'dial', unit: 'kHz' },
    ],
  },
  () => [5332, 5348, 5358.5, 5373, 5405].map((centre, at) => [at + 1, centre, centre - dialBelowCentreKhz]),
);
