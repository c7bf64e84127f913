import { describe, expect, it } from 'vitest';
import { eachComponent } from './components.ts';
import { type GreyPicture, blankPicture } from './grey.ts';
import { removeLeaders } from './leaders.ts';
import { medianFiltered } from './median.ts';
import { removePatches } from './patches.ts';
import { removeRules } from './rules.ts';

const dpi = 300;

function fill(picture: GreyPicture, [x, y, w, h]: [number, number, number, number], level = 40): GreyPicture {
  for (let row = y; row < y + h; row += 1)
    picture.data.fill(level, row * picture.width + x, row * picture.width + x + w);
  return picture;
}

const levelAt = ({ data, width }: GreyPicture, x: number, y: number): number => data[y * width + x] ?? -1;

describe('the median', () => {
  it('of every nine pixels is what sorting them gives', () => {
    let state = 7;
    const picture = blankPicture(40, 30);
    picture.data.forEach((_, at) => {
      state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
      picture.data[at] = state >>> 24;
    });
    const filtered = medianFiltered(picture);
    for (let y = 1; y < 29; y += 1) {
      for (let x = 1; x < 39; x += 1) {
        const around = [-1, 0, 1].flatMap((dy) => [-1, 0, 1].map((dx) => levelAt(picture, x + dx, y + dy)));
        expect(levelAt(filtered, x, y)).toBe(around.sort((a, b) => a - b)[4]);
      }
    }
  });
});

describe('pieces of ink', () => {
  it('are found once each, joined at corners too, with box and area', () => {
    const ink = new Uint8Array([1, 0, 0, 1, 0, 1, 0, 1, 0, 0, 0, 1]);
    const found: unknown[] = [];
    eachComponent({ width: 4, height: 3, ink }, (piece, pixels) =>
      found.push([piece, [...pixels].sort((a, b) => a - b)]),
    );
    expect(found).toEqual([
      [{ x: 0, y: 0, width: 2, height: 2, area: 2 }, [0, 5]],
      [{ x: 3, y: 0, width: 1, height: 3, area: 3 }, [3, 7, 11]],
    ]);
  });
});

describe('dot leaders', () => {
  const dots = (count: number, step: number): GreyPicture => {
    const page = fill(blankPicture(900, 200), [50, 80, 20, 36]);
    for (let dot = 0; dot < count; dot += 1) fill(page, [100 + dot * step, 110, 6, 6]);
    return page;
  };

  it('are painted out, and the letter before them is left', () => {
    const { picture, dots: found } = removeLeaders(dots(20, 22), dpi);
    expect([found, levelAt(picture, 103, 113), levelAt(picture, 60, 100)]).toEqual([20, 255, 40]);
  });

  it('are not seen in an ellipsis, nor in full stops far apart', () => {
    expect([removeLeaders(dots(3, 22), dpi).dots, removeLeaders(dots(8, 90), dpi).dots]).toEqual([0, 0]);
  });
});

describe('patches', () => {
  it('such as punch holes and the dark beside the sheet are painted out, and bold letters are left', () => {
    const page = blankPicture(1200, 1200);
    for (let y = -40; y <= 40; y += 1) {
      const half = Math.round(Math.sqrt(1600 - y * y));
      fill(page, [150 - half, 600 + y, half * 2, 1], 20);
    }
    fill(page, [0, 0, 12, 1200], 10);
    fill(page, [600, 300, 16, 70]);
    const cleaned = removePatches(page, dpi);
    expect([levelAt(cleaned, 150, 600), levelAt(cleaned, 5, 700), levelAt(cleaned, 608, 330)]).toEqual([255, 255, 40]);
  });
});

describe('rules', () => {
  it('that are faded and broken go too, and a row of crossbars of letters stays', () => {
    const page = fill(blankPicture(1500, 600), [700, 500, 60, 60]);
    for (let x = 100; x < 1300; x += 14) fill(page, [x, 200, 10, 2], 90);
    for (let letter = 0; letter < 6; letter += 1) {
      fill(page, [100 + letter * 30, 400, 28, 5]);
      fill(page, [108 + letter * 30, 400, 12, 40]);
    }
    const { picture } = removeRules(page, dpi);
    expect([levelAt(picture, 603, 200), levelAt(picture, 112, 402)]).toEqual([255, 40]);
  });
});
