/** In what state each sheet of the demo manuals has come down to the scanner. */
import type { Face } from './typewriter.ts';
import type { Pitch } from './sheet.ts';

export interface Look {
  readonly pitch: Pitch;
  /** Clockwise. */
  readonly skewDegrees: number;
  /** Blackness of a full strike: 1 is black, 0 is nothing. */
  readonly ink: number;
  /** How much the strike differs from place to place. */
  readonly uneven: number;
  /** Radius in dots by which the scanner smears. */
  readonly blur: number;
  /** Specks of dirt on the sheet. */
  readonly specks: number;
  /** Grain of the scanner, in grey levels. */
  readonly grain: number;
  /** Grey of the paper where the light is best. */
  readonly paper: number;
  /** Grey levels lost from the bright to the dark side. */
  readonly shade: number;
  readonly holes: number;
}

const good: Look = {
  pitch: 10,
  skewDegrees: 0.4,
  ink: 0.9,
  uneven: 0.24,
  blur: 1.1,
  specks: 35,
  grain: 4,
  paper: 236,
  shade: 16,
  holes: 2,
};
const middling: Look = { ...good, ink: 0.82, uneven: 0.36, blur: 1.3, specks: 80, grain: 6, paper: 231, shade: 30 };
const faded: Look = { ...middling, ink: 0.55, uneven: 0.42, paper: 224 };
const worn: Look = { ...middling, ink: 0.76, uneven: 0.46, blur: 1.5, specks: 170, grain: 7, paper: 216, shade: 40 };

const looks: Readonly<Record<string, Look>> = {
  'hb-12/Cover': { ...middling, skewDegrees: 0.5 },
  'hb-12/ii': { ...faded, skewDegrees: -0.35, holes: 0 },
  'hb-12/1-1': { ...good, skewDegrees: 0.3 },
  'hb-12/4-1': { ...good, skewDegrees: -0.6 },
  'hb-12/5-1': { ...good, skewDegrees: 0.45 },
  'hb-12/5-2': { ...middling, skewDegrees: -0.9 },
  'hb-12/5-3': { ...good, skewDegrees: 0.7 },
  'hb-12/6-1': { ...middling, pitch: 12, skewDegrees: -0.25 },
  'hb-12/6-2': { ...worn, pitch: 12, skewDegrees: 1.2 },
  'hb-12/7-1': { ...middling, skewDegrees: -0.5 },
  'sg-4/Cover': { ...good, skewDegrees: -0.4 },
  'sg-4/1-1': { ...middling, skewDegrees: 0.55 },
  'sg-4/2-1': { ...faded, ink: 0.6, skewDegrees: -0.7, holes: 1 },
  'sg-4/3-1': { ...good, skewDegrees: 0.25 },
  'sg-4/3-2': { ...middling, skewDegrees: -1 },
  'sg-4/4-1': { ...middling, skewDegrees: 0.8 },
};

const faces: Readonly<Record<string, Face>> = { 'hb-12': 'Demo Courier', 'sg-4': 'Demo Elite' };

export function lookOf(slug: string, label: string): Look & { readonly face: Face } {
  const look = looks[`${slug}/${label}`];
  const face = faces[slug];
  if (look === undefined || face === undefined) throw new Error(`Page ${label} of ${slug} has no look`);
  return { ...look, face };
}
