import { sg4Calibration } from './sg-4-calibration.ts';
import { sg4Front } from './sg-4-front.ts';
import { sg4Parts } from './sg-4-parts.ts';
import { sg4LivePlaces, sg4Quantities } from './sg-4-quantities.ts';
import type { DemoManual } from './types.ts';

export const sg4: DemoManual = {
  slug: 'sg-4',
  title: 'SG-4 Signal Generator: Instruction Manual',
  equipment: 'SG-4 signal generator',
  maker: 'Tarnholt Works',
  documentNumber: 'TW 204-1',
  editionDate: '1964-03',
  pages: [...sg4Front, ...sg4Calibration, ...sg4Parts],
  quantities: sg4Quantities,
  livePlaces: sg4LivePlaces,
};
