import { describe, expect, it } from 'vitest';
import { randomFromSeed } from '#shared/kit/random.ts';
import { type GreyPicture, blankPicture } from '#shared/reading/picture/grey.ts';
import { readWords } from '#shared/reading/words.fixture.ts';
import { withDigitsLookedAt } from './look-at-digits.ts';

/** Figures of an old typewriter, its 3 flat on top, as rows of five dots. */
const shapes: Record<string, string> = {
  '0': '.###. #...# #...# #...# #...# #...# .###.',
  '1': '..#.. .##.. ..#.. ..#.. ..#.. ..#.. #####',
  '2': '.###. #...# ....# ...#. ..#.. .#... #####',
  '3': '##### ...#. ..#.. .###. ....# #...# .###.',
  '4': '...#. ..##. .#.#. #..#. ##### ...#. ...#.',
  '5': '##### #.... ####. ....# ....# #...# .###.',
  '6': '.###. #.... #.... ####. #...# #...# .###.',
  '7': '##### ....# ...#. ...#. ..#.. ..#.. ..#..',
  '8': '.###. #...# #...# .###. #...# #...# .###.',
  '9': '.###. #...# #...# .#### ....# ....# .###.',
};
const dot = 4;

function draw(sheet: GreyPicture, digit: string, [left, top]: [number, number]): void {
  for (const [row, dots] of (shapes[digit] ?? '').split(' ').entries())
    for (const [column, each] of [...dots].entries())
      for (let y = 0; each === '#' && y < dot; y += 1)
        sheet.data.fill(
          20,
          (top + row * dot + y) * sheet.width + left + column * dot,
          (top + row * dot + y) * sheet.width + left + (column + 1) * dot,
        );
}

const random = randomFromSeed(7);
const printed = Array.from({ length: 12 }, () =>
  Array.from({ length: 4 }, () => String(Math.floor(100 + random() * 900))),
);

/** A page with that table, as the engine reads it: `bent` may change what it takes a cell for. */
function pageRead(bent: (text: string, row: number, column: number) => string) {
  const lines = printed.map((cells, row) => cells.map((text, column) => bent(text, row, column).padEnd(12)).join(''));
  const sheet = blankPicture(2000, 1200);
  const words = readWords(lines, { peg: 60 });
  printed.forEach((cells, row) =>
    cells.forEach((text, column) =>
      [...text].forEach((digit, at) => draw(sheet, digit, [300 + (column * 12 + at) * 30, 402 + row * 50])),
    ),
  );
  return { words, sheet };
}

const readIn = ({ words, sheet }: ReturnType<typeof pageRead>) =>
  withDigitsLookedAt(words, { picture: sheet, scale: 1 }).map(({ raw, seen }) => seen ?? raw);

describe('the figures of a table, each beside the others of the page', () => {
  it('are taken for what they look like, where some 3s were read as 5s', () => {
    const page = pageRead((text, row) => (row % 3 === 0 ? text.replaceAll('3', '5') : text));
    expect(page.words.map(({ raw }) => raw)).not.toEqual(printed.flat());
    expect(readIn(page)).toEqual(printed.flat());
  });

  it('keep what was read beside what is seen', () => {
    const page = pageRead((text, row, column) => (row === 4 && column === 2 ? `_${text.slice(1)}e` : text));
    const found = withDigitsLookedAt(page.words, { picture: page.sheet, scale: 1 });
    expect(found.filter(({ seen }) => seen !== undefined)).toMatchObject([
      { raw: `_${printed[4]?.[2]?.slice(1)}e`, seen: printed[4]?.[2] },
    ]);
  });

  it('are read without the line that is typed under them and touches them', () => {
    const page = pageRead((text, row) => (row === 11 ? 'peg' : text));
    for (const column of [0, 1, 2, 3])
      for (let y = 0; y < 5; y += 1) {
        const from = (402 + 11 * 50 + 7 * dot + y) * page.sheet.width + 300 + column * 360;
        page.sheet.data.fill(20, from - 20, from + 90);
      }
    const wide = page.words.map((word) =>
      word.raw === 'peg'
        ? { ...word, box: [word.box[0] - 20, word.box[1], 110, 36] as [number, number, number, number] }
        : word,
    );
    expect(readIn({ ...page, words: wide })).toEqual(printed.flat());
  });

  it('are left alone where all were read as they look, and where there are too few to compare', () => {
    const page = pageRead((text) => text);
    expect(withDigitsLookedAt(page.words, { picture: page.sheet, scale: 1 })).toEqual(page.words);
    const few = readWords(['120    340    560', '121    341    561', '122    342    562']);
    expect(withDigitsLookedAt(few, { picture: page.sheet, scale: 1 })).toEqual(few);
  });
});
