import { arrow, box, crystal, type Drawing, ground, type Lettering, line, type Point } from './ink.ts';

const size: Point = [290, 128];

const blocks: readonly (readonly [Point, string, string])[] = [
  [[40, 40], 'OSCILLATOR', 'V1'],
  [[500, 40], 'TRIPLER', 'V2'],
  [[960, 40], 'MODULATOR', 'V3'],
  [[1420, 40], 'ATTENUATOR', 'AND METER'],
  [[500, 260], 'BEAT MIXER', 'V5'],
  [[960, 260], 'CALIBRATOR', 'V4'],
];

const named = ([[x, y], first, second]: (typeof blocks)[number]): Lettering[] => [
  { x: x + size[0] / 2, y: y + 56, text: first, at: 'middle' },
  { x: x + size[0] / 2, y: y + 98, text: second, at: 'middle' },
];

export const sg4Chain: Drawing = {
  width: 1900,
  height: 490,
  shapes: [
    ...blocks.map(([corner]) => box(corner, size)),
    arrow([330, 104], [500, 104]),
    arrow([790, 104], [960, 104]),
    arrow([1250, 104], [1420, 104]),
    arrow([1710, 104], [1860, 104]),
    arrow([185, 168], [185, 324], [500, 324]),
    arrow([960, 324], [790, 324]),
    line([1250, 324], [1370, 324]),
    crystal([1370, 324]),
    ground([1370, 444]),
    arrow([645, 388], [645, 470]),
  ],
  lettering: [
    ...blocks.flatMap(named),
    { x: 415, y: 90, text: 'BAND F', at: 'middle' },
    { x: 1415, y: 396, text: 'Y1 1000 KC', at: 'start' },
    { x: 1735, y: 150, text: 'OUTPUT', at: 'start' },
    { x: 680, y: 450, text: 'PHONES', at: 'start' },
  ],
};
