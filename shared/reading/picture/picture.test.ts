import { describe, expect, it } from 'vitest';
import { findFigures } from './figures.ts';
import { flatten } from './flatten.ts';
import { type GreyPicture, blankPicture, inkThreshold, shrink } from './grey.ts';
import { hasTwoColumns } from './layout.ts';
import { removeRules } from './rules.ts';
import { skewDegrees } from './skew.ts';

const ink = 40;

function fill(picture: GreyPicture, [x, y, w, h]: [number, number, number, number], level = ink): GreyPicture {
  for (let row = y; row < y + h; row += 1)
    picture.data.fill(level, row * picture.width + x, row * picture.width + x + w);
  return picture;
}

/** Rows of short strokes, as lines of print look from afar; `slope` lets them fall to the right. */
function textLines(
  picture: GreyPicture,
  { left, right, slope = 0 }: { left: number; right: number; slope?: number },
): GreyPicture {
  for (let top = 100; top < picture.height - 120; top += 18) {
    for (let x = left; x < right - 8; x += 9) fill(picture, [x, Math.round(top + x * slope), 5, 8]);
  }
  return picture;
}

describe('the skew of a page', () => {
  it.each([-2.5, -0.7, 0, 0.4, 1.2, 3])('of %d degrees is measured to a twentieth of a degree', (degrees) => {
    const page = textLines(blankPicture(850, 1100), {
      left: 80,
      right: 770,
      slope: Math.tan((degrees * Math.PI) / 180),
    });
    expect(Math.abs(skewDegrees(page) - degrees)).toBeLessThan(0.08);
  });

  it('of an empty page is none', () => {
    expect(skewDegrees(blankPicture(850, 1100))).toBe(0);
  });
});

describe('flattening', () => {
  it('makes paper that darkens to one side even, and keeps the ink dark', () => {
    const page = blankPicture(640, 320);
    for (let y = 0; y < 320; y += 1) for (let x = 0; x < 640; x += 1) page.data[y * 640 + x] = 230 - x * 0.15;
    fill(page, [100, 100, 12, 40]);
    fill(page, [540, 100, 12, 40]);
    const flat = flatten(page);
    const at = (x: number, y: number): number => flat.data[y * 640 + x] ?? 0;
    expect(Math.min(at(20, 20), at(620, 20), at(320, 300))).toBeGreaterThan(245);
    expect(Math.max(at(105, 120), at(545, 120))).toBeLessThan(90);
  });
});

describe('ruling lines', () => {
  it('are painted out across and down, and letters are left', () => {
    const page = blankPicture(900, 600);
    fill(page, [50, 100, 800, 3]);
    fill(page, [200, 100, 3, 400]);
    fill(page, [300, 200, 20, 30]);
    const { picture, rules } = removeRules(page, 300);
    const level = (x: number, y: number): number => picture.data[y * 900 + x] ?? 0;
    expect([level(400, 101), level(201, 300), level(310, 215)]).toEqual([255, 255, ink]);
    expect(new Set(rules.map(({ direction }) => direction))).toEqual(new Set(['across', 'down']));
  });

  it('are not seen in a dark patch', () => {
    const page = fill(blankPicture(900, 600), [100, 100, 300, 200]);
    expect(removeRules(page, 300).rules).toEqual([]);
  });
});

describe('columns', () => {
  it('of text, two of them, are told from one', () => {
    const two = textLines(textLines(blankPicture(850, 1100), { left: 80, right: 400 }), { left: 450, right: 770 });
    expect(hasTwoColumns(two, 100)).toBe(true);
    expect(hasTwoColumns(textLines(blankPicture(850, 1100), { left: 80, right: 770 }), 100)).toBe(false);
  });

  it('of a table are not taken for columns of text', () => {
    const page = blankPicture(850, 1100);
    for (const left of [80, 260, 450, 640]) textLines(page, { left, right: left + 90 });
    expect(hasTwoColumns(page, 100)).toBe(false);
  });
});

describe('drawings', () => {
  it('are found where ink is neither words nor tables, gathered into one', () => {
    const page = blankPicture(850, 1100);
    for (const [x, y] of [
      [200, 300],
      [320, 300],
      [440, 340],
    ] as const) {
      for (const edge of [
        [x, y, 90, 2],
        [x, y + 60, 90, 2],
        [x, y, 2, 60],
        [x + 88, y, 2, 62],
      ] as const)
        fill(page, [...edge]);
    }
    const [figure, ...others] = findFigures(page, 100, { words: [], tables: [] });
    expect(others).toEqual([]);
    const [x, y, w, h] = figure ?? [0, 0, 0, 0];
    expect([Math.abs(x - 200) < 8, Math.abs(y - 300) < 8, Math.abs(w - 330) < 12, Math.abs(h - 104) < 12]).toEqual([
      true,
      true,
      true,
      true,
    ]);
    expect(findFigures(page, 100, { words: [], tables: [[190, 290, 360, 130]] })).toEqual([]);
  });
});

describe('a grey picture', () => {
  it('shrinks by taking means', () => {
    expect([
      ...shrink({ width: 4, height: 2, data: Uint8Array.from([0, 100, 200, 200, 100, 200, 0, 0]) }, 2).data,
    ]).toEqual([100, 100]);
  });

  it('has a threshold between its ink and its paper', () => {
    const threshold = inkThreshold(fill(blankPicture(100, 100), [10, 10, 20, 20]));
    expect(threshold).toBeGreaterThanOrEqual(ink);
    expect(threshold).toBeLessThan(255);
  });
});
