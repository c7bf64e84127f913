import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { readPage } from '#server/features/recognition/read.ts';
import { tablesOf } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { type Mark, linesAt, scanned } from '../helpers/printed-page.ts';

/** Pages printed here and read back: what must come through whatever changes in the recipe. All wording is invented. */
const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-reading-'));
afterAll(() => rmSync(folder, { recursive: true }));

async function readBack(marks: readonly Mark[], look: Parameters<typeof scanned>[1]) {
  const drawn = path.join(folder, 'drawn.jpg');
  writeFileSync(drawn, await scanned(marks, look));
  const reading = await readPage({ drawn, dpi: 300, target: path.join(folder, 'read.jpg'), wish: {} });
  return documentOf(reading);
}

const share = (wanted: readonly string[], text: string): number =>
  wanted.filter((each) => text.includes(each)).length / wanted.length;

const paragraph = [
  'The sweep oscillator is held within ±2% of the dial by a regulator tube. Capacitor',
  'C107 (.005 µf) and resistor R112 (470 Ω) feed the mixer; drill the panel ½ in. and',
  'the bracket ¼ in. from its edge. With 250 v at the plate the current is 3.5 ma.',
];
const steps = [
  'a. Set the generator to 455 kc and tune L3 for the greatest reading.',
  'b. Note the reading at 25° C, and do not go over 0.5 v at the grid.',
  'c. Detune the trap ±9 kc on both sides; the loss must be 6 db or more.',
];

describe('a printed page, leaning and specked', () => {
  it('gives its numbers, its signs and its steps back', async () => {
    const document = await readBack(
      [
        { text: '3-4. ALIGNMENT OF THE SWEEP', x: 1, y: 1.5, points: 12 },
        ...linesAt(1, 2, paragraph),
        { text: 'WARNING', x: 3.8, y: 3, points: 12 },
        ...linesAt(1.6, 3.3, ['Dangerous voltages are present at the plate cap of V103.']),
        ...linesAt(1, 4, steps, 0.32),
      ],
      { face: 'serif', leanDegrees: 1 },
    );
    const text = textOf(document);
    expect(
      share(['470 Ω', '.005 µf', '±2%', '455 kc', '25°', '0.5 v', '±9 kc', '6 db', '250 v', '3.5 ma'], text),
    ).toBeGreaterThanOrEqual(0.9);
    expect(share(['½ in.', '¼ in.'], text)).toBe(1);
    const kinds = document.content.map(({ type }) => type);
    expect(kinds.filter((kind) => kind === 'step')).toHaveLength(3);
    expect(kinds).toContain('admonition');
  });

  it('gives a ruled list back row by row', async () => {
    const rows = [
      ['C101', 'CAPACITOR: 100 mmf', '500 v', '2'],
      ['C102', 'CAPACITOR: .01 mfd', '300 v', '1'],
      ['R101', 'RESISTOR: 47 K', '1/2 w', '4'],
      ['R102', 'RESISTOR: 2.2 meg', '1 w', '1'],
      ['T101', 'TRANSFORMER, POWER', '115 v', '1'],
    ];
    const columns = [1, 2.2, 5, 6.4, 7.2];
    const marks: Mark[] = [
      ...['SYMBOL', 'DESCRIPTION', 'RATING', 'QTY'].map((text, at) => ({ text, x: (columns[at] ?? 0) + 0.1, y: 2 })),
      ...rows.flatMap((cells, row) =>
        cells.map((text, at) => ({ text, x: (columns[at] ?? 0) + 0.1, y: 2.3 + row * 0.3 })),
      ),
      ...columns.map((x): Mark => ({ rule: [x, 1.75, x, 3.65] })),
      ...[1.75, ...rows.map((_, row) => 2.1 + row * 0.3), 3.65].map((y): Mark => ({ rule: [1, y, 7.2, y] })),
    ];
    const [table] = tablesOf(await readBack(marks, { face: 'typewriter', leanDegrees: -0.7 }));
    expect(
      table?.rows
        .slice(1)
        .flat()
        .filter((cell, at) => cell === rows.flat()[at]).length,
    ).toBeGreaterThanOrEqual(18);
  });

  it('gives two columns back one after the other, though it leans and a title runs across both', async () => {
    const left = Array.from({ length: 12 }, (_, at) => `left line ${at + 1} of the text in this column`);
    const right = left.map((line) => line.replace('left', 'right'));
    const document = await readBack(
      [
        ...linesAt(1, 1.5, ['This sentence runs across both of the columns, from one margin to the other one.']),
        ...linesAt(1, 2.1, left),
        ...linesAt(4.6, 2.1, right),
      ],
      { face: 'serif', leanDegrees: 2 },
    );
    const found = [...textOf(document).matchAll(/(left|right) line (\d+)/g)].map(([, side, line]) => `${side} ${line}`);
    expect(found).toEqual(['left', 'right'].flatMap((side) => left.map((_, at) => `${side} ${at + 1}`)));
  });
});
