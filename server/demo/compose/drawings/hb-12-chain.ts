import { arrow, box, circle, crystal, type Drawing, ground, line, type Lettering, type Point } from './ink.ts';

const size: Point = [226, 128];
const step = 282;
const top = 90;

const stages: readonly (readonly [string, string])[] = [
  ['R-F AMPL', 'V1'],
  ['FIRST', 'MIXER V2'],
  ['FIRST', 'I-F V3'],
  ['SECOND', 'MIXER V6'],
  ['SECOND', 'I-F V7'],
  ['LIMITERS', 'V8, V9'],
  ['DISCR', 'V10'],
];

const named = ([x, y]: Point, [first, second]: readonly [string, string]): Lettering[] => [
  { x: x + size[0] / 2, y: y + 56, text: first, at: 'middle' },
  { x: x + size[0] / 2, y: y + 98, text: second, at: 'middle' },
];

const left = (stage: number): number => stage * step + 12;
const middle = (stage: number): number => left(stage) + size[0] / 2;
const centre = top + size[1] / 2;

const path = stages.map((_, stage) => box([left(stage), top], size));
const joints = stages.slice(1).map((_, stage) => arrow([left(stage) + size[0], centre], [left(stage + 1), centre]));

const chain = [
  box([left(1), 340], size),
  box([left(1), 560], size),
  arrow([middle(1), 340], [middle(1), top + size[1]]),
  arrow([middle(1), 560], [middle(1), 340 + size[1]]),
  line([left(1), 624], [130, 624], [130, 640]),
  crystal([130, 640]),
  ground([130, 760]),
  box([left(3), 340], size),
  arrow([middle(3), 340], [middle(3), top + size[1]]),
  line([left(3) + size[0], 404], [1220, 404], [1220, 420]),
  crystal([1220, 420]),
  ground([1220, 540]),
];

const output = [
  arrow([middle(6), top + size[1]], [middle(6), 340]),
  box([left(6), 340], size),
  line([middle(6), 340 + size[1]], [middle(6), 540]),
  circle([middle(6), 572], 32),
];

export const hb12Chain: Drawing = {
  width: 1960,
  height: 810,
  shapes: [
    ...path,
    ...joints,
    ...chain,
    ...output,
    line([left(0) + 60, top], [left(0) + 60, 20], [left(0) + 30, 0]),
    line([left(0) + 60, 20], [left(0) + 90, 0]),
  ],
  lettering: [
    ...stages.flatMap((words, stage) => named([left(stage), top], words)),
    ...named([left(1), 340], ['TRIPLER', 'V5']),
    ...named([left(1), 560], ['OSC, X 3', 'V4']),
    ...named([left(3), 340], ['CRYSTAL', 'OSC V6']),
    ...named([left(6), 340], ['AUDIO', 'V11, V12']),
    { x: middle(0) + 5, y: 44, text: '156.600 MC', at: 'start' },
    { x: middle(2), y: 66, text: '10.700 MC', at: 'middle' },
    { x: middle(4), y: 66, text: '455 KC', at: 'middle' },
    { x: middle(1) + 24, y: 292, text: '145.900 MC', at: 'start' },
    { x: middle(1) + 24, y: 524, text: '48.633 MC', at: 'start' },
    { x: middle(3) + 24, y: 292, text: '10.245 MC', at: 'start' },
    { x: 180, y: 690, text: 'Y1', at: 'start' },
    { x: 180, y: 734, text: '16.211111 MC', at: 'start' },
    { x: 1270, y: 490, text: 'Y2', at: 'start' },
    { x: middle(6), y: 650, text: 'LS1', at: 'middle' },
  ],
};
