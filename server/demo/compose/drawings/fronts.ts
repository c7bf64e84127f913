import { box, circle, dot, type Drawing, line, type Point } from './ink.ts';

/** A knob with its pointer turned so many degrees from upright. */
function knob([x, y]: Point, radius: number, degrees: number): string {
  const angle = (degrees * Math.PI) / 180;
  const tip: Point = [Math.round(x + radius * Math.sin(angle)), Math.round(y - radius * Math.cos(angle))];
  return circle([x, y], radius) + circle([x, y], radius * 0.62) + line([x, y], tip);
}

const corners = (width: number, height: number): string[] =>
  [
    [40, 40],
    [width - 40, 40],
    [40, height - 40],
    [width - 40, height - 40],
  ].map(([x = 0, y = 0]) => circle([x, y], 12));

const grille = Array.from({ length: 15 }, (_, bar) => line([130, 130 + bar * 26], [600, 130 + bar * 26]));

export const hb12Front: Drawing = {
  width: 1340,
  height: 640,
  shapes: [
    box([4, 4], [1332, 590]),
    box([22, 22], [1296, 554]),
    ...corners(1340, 598),
    box([110, 110], [510, 404]),
    ...grille,
    box([720, 120], [230, 110]),
    circle([1110, 175], 40),
    knob([800, 420], 62, -40),
    knob([1000, 420], 62, 30),
    line([1190, 380], [1190, 460]),
    circle([1190, 420], 30),
    box([120, 598], [120, 34]),
    box([1100, 598], [120, 34]),
  ],
  lettering: [
    { x: 835, y: 188, text: 'HB-12', at: 'middle' },
    { x: 1110, y: 258, text: 'WATCH', at: 'middle' },
    { x: 800, y: 530, text: 'VOLUME', at: 'middle' },
    { x: 1000, y: 530, text: 'SQUELCH', at: 'middle' },
    { x: 1190, y: 530, text: 'POWER', at: 'middle' },
  ],
};

/** Marks round the upper half of the dial. */
const dialMarks = Array.from({ length: 25 }, (_, mark) => {
  const angle = ((mark * 7.5 - 90) * Math.PI) / 180;
  const inner = mark % 4 === 0 ? 168 : 184;
  const at = (radius: number): Point => [
    Math.round(700 + radius * Math.sin(angle)),
    Math.round(330 - radius * Math.cos(angle)),
  ];
  return line(at(inner), at(204));
});

export const sg4Front: Drawing = {
  width: 1400,
  height: 760,
  shapes: [
    box([4, 4], [1392, 720]),
    box([22, 22], [1356, 684]),
    ...corners(1400, 728),
    circle([700, 330], 214),
    ...dialMarks,
    knob([700, 330], 110, 20),
    box([120, 120], [270, 200]),
    `<path d="M150,260 Q255,150 360,260"/>`,
    line([255, 300], [310, 190]),
    knob([1180, 220], 70, 60),
    knob([255, 480], 60, -120),
    knob([1180, 480], 60, 15),
    circle([540, 620], 24),
    dot([540, 620]),
    circle([860, 620], 24),
    dot([860, 620]),
  ],
  lettering: [
    { x: 255, y: 108, text: 'CARRIER', at: 'middle' },
    { x: 1180, y: 128, text: 'BAND', at: 'middle' },
    { x: 255, y: 592, text: 'MOD', at: 'middle' },
    { x: 1180, y: 592, text: 'ATTENUATOR', at: 'middle' },
    { x: 540, y: 690, text: 'PHONES', at: 'middle' },
    { x: 860, y: 690, text: 'OUTPUT', at: 'middle' },
  ],
};
