import { lazyTable } from '../tables.ts';
import { numbersFrom } from './numbers.ts';

/**
 * Channel 14 is the anchor; each step is an exact fraction of a megahertz, and only the last operation rounds. Printed tables
 * round in between: they differ by up to 3 Hz at X band.
 */
const links = [
  { name: 'S up', anchor: 2113.3125, over: 221, under: 648 },
  { name: 'S down', anchor: 2295, over: 10, under: 27 },
  { name: 'X up', anchor: 7162.3125, over: 749, under: 648 },
  { name: 'X down', anchor: 8415, over: 110, under: 81 },
];
export const deepSpace = lazyTable(
  {
    id: 'deep-space',
    title: 'Deep-space channels at S and X band',
    source: 'DSN 810-005, module 201 (from memory; the rule was held against published carriers)',
    key: { name: 'channel', unit: '' },
    columns: links.map(({ name }) => ({ name, unit: 'MHz' })),
  },
  () =>
    numbersFrom(3, 37).map((channel) => [
      channel,
      ...links.map(({ anchor, over, under }) => (anchor * under + over * (channel - 14)) / under),
    ]),
);

/** Coherent turnaround: down = up × numerator / denominator. 880/241, sometimes printed, has no source: 241 is a misread 221. */
const ratios = [
  { name: 'S up to S down', over: 240, under: 221 },
  { name: 'S up to X down', over: 880, under: 221 },
  { name: 'X up to X down', over: 880, under: 749 },
  { name: 'X up to S down (from memory)', over: 240, under: 749 },
  { name: 'X up to Ka down (from memory)', over: 3344, under: 749 },
  { name: 'S up to Ka down (from memory)', over: 3344, under: 221 },
  { name: 'Ka up to Ka down, near Earth, first', over: 2720, under: 2407 },
  { name: 'Ka up to Ka down, near Earth, second', over: 2760, under: 2407 },
  { name: 'Ka up to Ka down, near Earth, third', over: 2816, under: 2407 },
  { name: 'SGLS up to down (from memory)', over: 256, under: 205 },
];
export const turnaround = lazyTable(
  {
    id: 'turnaround',
    title: 'Coherent turnaround ratios',
    source: 'CCSDS 411.0-G-3 (240/221); Anderson et al. 2001 (880/221); CCSDS tracking data of Cassini (880/749)',
    key: { name: 'link', unit: '' },
    columns: [
      { name: 'numerator', unit: '' },
      { name: 'denominator', unit: '' },
    ],
    rowNames: ratios.map(({ name }) => name),
  },
  () => ratios.map(({ over, under }, at) => [at + 1, over, under]),
);
