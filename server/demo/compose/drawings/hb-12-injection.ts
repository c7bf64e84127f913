import {
  capacitor,
  capacitorAcross,
  coil,
  crystal,
  dot,
  type Drawing,
  ground,
  type Lettering,
  line,
  type Point,
  resistor,
  tube,
} from './ink.ts';

/** What differs from one stage to the next; the wiring of the three is the same. */
interface Stage {
  readonly left: number;
  readonly top: number;
  readonly names: Readonly<
    Record<'tube' | 'part' | 'grid' | 'coil' | 'coupling' | 'bypass' | 'supply', readonly string[]>
  >;
}

/** Places inside a stage, from its left top corner. */
const plateX = 330;
const gridX = 150;
const tubeY = 540;
/** Where the plate is tapped for the next stage. */
const tapY = 420;

function stageShapes({ left, top }: Stage): string[] {
  const at = (x: number, y: number): Point => [left + x, top + y];
  return [
    tube(at(plateX, tubeY)),
    line(at(gridX, tubeY), at(plateX - 110, tubeY)),
    dot(at(gridX, tubeY)),
    resistor(at(gridX, tubeY)),
    ground(at(gridX, tubeY + 120)),
    line(at(plateX - 28, tubeY + 110), at(plateX - 28, tubeY + 120)),
    ground(at(plateX - 28, tubeY + 120)),
    coil(at(plateX, 200)),
    line(at(plateX, 340), at(plateX, tubeY - 110)),
    dot(at(plateX, tapY)),
    line(at(plateX, tapY), at(plateX + 130, tapY)),
    capacitorAcross(at(plateX + 130, tapY)),
    dot(at(plateX, 190)),
    line(at(plateX, 200), at(plateX, 170)),
    resistor(at(plateX, 50)),
    line(at(plateX, 50), at(plateX, 30)),
    line(at(plateX, 190), at(plateX + 190, 190)),
    capacitor(at(plateX + 190, 190)),
    ground(at(plateX + 190, 310)),
  ];
}

function stageLettering({ left, top, names }: Stage): Lettering[] {
  const put = (x: number, y: number, words: readonly string[]): Lettering[] =>
    words.map((text, index) => ({ x: left + x, y: top + y + index * 40, text, at: 'start' }));
  return [
    ...put(plateX + 96, tubeY - 10, names.tube),
    ...put(gridX + 26, tubeY + 62, names.grid),
    ...put(plateX - 120, 262, names.coil),
    ...put(plateX + 205, tapY + 62, names.coupling),
    ...put(plateX + 232, 244, names.bypass),
    ...put(plateX + 30, 104, names.part),
    ...put(plateX - 60, 16, names.supply),
  ];
}

const oscillator: Stage = {
  left: 20,
  top: 20,
  names: {
    tube: ['V4 OSC', 'AND', 'TRIPLER'],
    part: ['R6', '4.7K'],
    grid: ['R5', '47K'],
    coil: ['L5'],
    coupling: ['C22 68'],
    bypass: ['C11', '.0047 MFD'],
    supply: ['+210 V'],
  },
};

const tripler: Stage = {
  left: 780,
  top: 20,
  names: {
    tube: ['V5', 'SECOND', 'TRIPLER'],
    part: ['R8', '22K'],
    grid: ['R7', '470K'],
    coil: ['L6'],
    coupling: ['C8 2.2'],
    bypass: ['C12', '.0047 MFD'],
    supply: ['+195 V'],
  },
};

const mixer: Stage = {
  left: 780,
  top: 900,
  names: {
    tube: ['V2', 'FIRST', 'MIXER'],
    part: ['R4', '1000'],
    grid: ['R2', '100K'],
    coil: ['T1'],
    coupling: ['C10 220'],
    bypass: ['C3', '.001 MFD'],
    supply: ['+180 V'],
  },
};

const stages = [oscillator, tripler, mixer];

/** From the coupling capacitor of one stage to the grid of the next. */
const joints = [
  line([600, 440], [730, 440], [730, 790], [860, 790], [860, 560], [930, 560]),
  line([1360, 440], [1720, 440], [1720, 850], [720, 850], [720, 1440]),
  line([170, 560], [60, 560], [60, 590]),
  crystal([60, 590]),
  capacitor([60, 710]),
  line([22, 806], [100, 736]),
  ground([60, 830]),
  line([1360, 1320], [1560, 1320]),
  line([460, 1440], [540, 1440]),
  capacitorAcross([540, 1440]),
  line([660, 1440], [930, 1440]),
  dot([720, 1440]),
];

export const hb12Injection: Drawing = {
  width: 1900,
  height: 1640,
  shapes: [...stages.flatMap(stageShapes), ...joints],
  lettering: [
    ...stages.flatMap(stageLettering),
    { x: 96, y: 662, text: 'Y1', at: 'start' },
    { x: 120, y: 800, text: 'C20 3-15', at: 'start' },
    { x: 0, y: 920, text: '16.211111 MC', at: 'start' },
    { x: 640, y: 834, text: '48.633 MC', at: 'start' },
    { x: 1180, y: 832, text: '145.900 MC', at: 'start' },
    { x: 440, y: 1430, text: 'FROM L3', at: 'end' },
    { x: 440, y: 1470, text: '156.600 MC', at: 'end' },
    { x: 1580, y: 1310, text: 'TO V3', at: 'start' },
    { x: 1580, y: 1350, text: '10.700 MC', at: 'start' },
    { x: 550, y: 1395, text: 'C7 100', at: 'start' },
    { x: 866, y: 545, text: 'TP3', at: 'start' },
    { x: 850, y: 1420, text: 'TP2', at: 'start' },
  ],
};
