import { describe, expect, it } from 'vitest';
import { repairWords } from '#shared/reading/repair.ts';
import { readWords } from '#shared/reading/words.fixture.ts';
import { blankPicture } from '#shared/reading/picture/grey.ts';
import { glyphIn } from './classify.ts';
import { likelihoods, packed, unpacked } from './network.ts';
import { inkBox, inputs, patchOf, side } from './patch.ts';
import { lineMeasure } from './spelled.ts';

/** A sheet with one black box on it. */
function sheetWith([x, y, w, h]: [number, number, number, number]) {
  const sheet = blankPicture(60, 60);
  for (let row = y; row < y + h; row += 1) sheet.data.fill(0, row * 60 + x, row * 60 + x + w);
  return sheet;
}

describe('a patch', () => {
  it('is filled by the longer side of the ink, whose place on the line stands behind the pixels', () => {
    const sheet = sheetWith([20, 10, 10, 20]);
    expect(inkBox(sheet, [0, 0, 60, 60])).toEqual([20, 10, 10, 20]);
    const patch = patchOf(sheet, [20, 10, 10, 20], { baseline: 30, capital: 20 });
    expect(patch).toHaveLength(inputs);
    expect(patch[0]).toBe(0);
    expect(patch[side / 2]).toBe(1);
    expect([...patch.slice(-3)].map((each) => Math.round(each * 100))).toEqual([-10, 20, 0]);
  });

  it('is none where there is no ink', () => {
    expect(inkBox(blankPicture(9, 9), [0, 0, 9, 9])).toBeNull();
    expect(glyphIn(blankPicture(9, 9), [0, 0, 9, 9], { baseline: 9, capital: 9 })).toBeNull();
  });
});

describe('the network', () => {
  it('gives likelihoods that add up to 1, the higher the score the likelier', () => {
    const network = {
      inputs: 1,
      hidden: 1,
      classes: 2,
      first: Float32Array.of(2, 0),
      second: Float32Array.of(1, 0, -1, 0),
    };
    const [a = 0, b = 0] = likelihoods(network, Float32Array.of(0.5));
    expect(a + b).toBeCloseTo(1);
    // e to the 1 against e to the -1.
    expect(a / b).toBeCloseTo(Math.exp(2));
  });

  it('keeps its weights to within half a step when they are packed', () => {
    const weights = Float32Array.of(-1.5, 0, 0.4, 2);
    const { packed: text, step } = packed(weights);
    unpacked(text, step).forEach((weight, at) =>
      expect(Math.abs(weight - (weights[at] ?? 0))).toBeLessThanOrEqual(step / 2 + 1e-6),
    );
  });

  it('knows a bar in the middle of the line for a dash, and no sign', () => {
    const seen = glyphIn(sheetWith([10, 29, 10, 3]), [0, 0, 60, 60], { baseline: 40, capital: 24 });
    expect(['-', '–']).toContain(seen?.glyph);
  });
});

describe('the measure of a line', () => {
  it('comes from its letters, and not from marks and descenders', () => {
    const symbol = (text: string, top: number, height: number) => ({
      text,
      box: [0, top, 9, height] as [number, number, number, number],
    });
    const line = [
      symbol('A', 10, 20),
      symbol('g', 16, 20),
      symbol('1', 10, 20),
      symbol('b', 10, 20),
      symbol('.', 28, 2),
    ];
    expect(lineMeasure(line)).toEqual({ baseline: 30, capital: 20 });
    expect(lineMeasure(line.slice(3))).toBeNull();
  });
});

describe('grammar and picture', () => {
  const repaired = (line: string, seen: Record<string, string>) =>
    repairWords(readWords([line]).map((word) => (word.text in seen ? { ...word, seen: seen[word.text] ?? '' } : word)));

  it('are no doubt where they agree', () => {
    expect(repaired('held to *5% of it', { '*5%': '±5%' })[2]).toMatchObject({ text: '±5%', raw: '*5%', sure: true });
  });

  it('leave a plus where the picture shows one', () => {
    expect(repaired('moved +9 kc up', { '+9': '+9' })[1]).toMatchObject({ text: '+9' });
  });

  it('are a doubt where only the picture shows a sign', () => {
    expect(repaired('a short 34 in.', { '34': '½' })[2]).toMatchObject({ text: '½', raw: '34', sure: false });
  });
});
