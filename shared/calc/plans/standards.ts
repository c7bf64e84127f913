import { lazyTable } from '../tables.ts';

/** One row per carrier, counted from 1; a station that is closed, or has moved, says so. */
const stations: readonly [name: string, khz: number][] = [
  ...[2500, 5000, 10_000, 15_000, 20_000].map((khz): [string, number] => ['WWV', khz]),
  ...[2500, 5000, 10_000, 15_000].map((khz): [string, number] => ['WWVH', khz]),
  ['WWVB', 60],
  ...[3330, 7335, 14_670].map((khz): [string, number] => ['CHU (before 2009)', khz]),
  ...[3330, 7850, 14_670].map((khz): [string, number] => ['CHU (now; from memory)', khz]),
  ['MSF', 60],
  ['DCF77', 77.5],
  ['HBG (closed)', 75],
  ...[5000, 8000, 10_000].map((khz): [string, number] => ['JJY at HF (closed)', khz]),
  ...[40, 60].map((khz): [string, number] => ['JJY at LF (from memory)', khz]),
  ...[2500, 5000, 10_000, 15_000].map((khz): [string, number] => ['BPM', khz]),
  ['HLA', 5000],
  ...[5000, 10_000, 15_000].map((khz): [string, number] => ['LOL', khz]),
  ['RBU', 200 / 3],
];
export const timeStations = lazyTable(
  {
    id: 'time-stations',
    title: 'Standard time and frequency stations',
    source: 'NIST station descriptions (secondary); a published list of standard frequency transmissions (secondary)',
    key: { name: 'entry', unit: '' },
    columns: [{ name: 'carrier', unit: 'kHz' }],
    rowNames: stations.map(([name]) => name),
  },
  () => stations.map(([, khz], at) => [at + 1, khz]),
);

/** Common practice, no source, but for the intercarrier sound: 47 CFR 73.682(a). */
const customary: readonly [use: string, khz: number][] = [
  ['AM broadcast, HF and land mobile second IF', 455],
  ['AM broadcast, early sets', 175],
  ['car radio, AM', 262.5],
  ['European AM variants', 465],
  ['FM broadcast and VHF first IF', 10_700],
  ['land mobile and scanner first IF', 21_400],
  ['land mobile first IF, later', 45_000],
  ['satellite and microwave IF', 70_000],
  ['satellite and microwave IF, wide', 140_000],
  ['US TV picture IF', 45_750],
  ['US TV sound IF', 41_250],
  ['US TV intercarrier sound', 4500],
  ['early US TV picture IF', 25_750],
  ['early US TV sound IF', 21_250],
];
export const standardIfs = lazyTable(
  {
    id: 'standard-ifs',
    title: 'Customary intermediate frequencies',
    source: 'Common practice, no source; intercarrier sound: 47 CFR 73.682(a)',
    key: { name: 'entry', unit: '' },
    columns: [{ name: 'frequency', unit: 'kHz' }],
    rowNames: customary.map(([use]) => use),
  },
  () => customary.map(([, khz], at) => [at + 1, khz]),
);
