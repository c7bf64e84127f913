import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { allNodes } from '#shared/document/text-of.ts';
import { habitsFrom, lessonsOf } from './lessons.ts';
import type { Reading } from './reading.ts';
import { documentOf } from './structure.ts';
import { taught } from './teach.ts';
import { readWords, readingOf } from './words.fixture.ts';

const readingOfLines = (lines: readonly string[], confidences: Record<string, number> = {}) =>
  readingOf(readWords(lines, confidences));
const corrected = (reading: Reading, from: string, to: string): DocNode =>
  JSON.parse(JSON.stringify(documentOf(reading)).replaceAll(`"text":"${from}"`, `"text":"${to}"`)) as DocNode;
const doubts = (document: DocNode) =>
  [...allNodes(document)].flatMap(({ text, marks }) =>
    (marks ?? []).filter(({ type }) => type === 'doubt').map(({ attrs }) => ({ text, ...attrs })),
  );

const first = readingOfLines(['Adjust the discriminator for zero.', 'The discriminator is in the first if can.']);
const second = readingOfLines(['Turn the discriminator by hand.']);
const vouching = [lessonsOf(documentOf(first), first), lessonsOf(documentOf(second), second)];
const page = (lines: readonly string[], confidences: Record<string, number> = {}): PageDocument =>
  documentOf(readingOfLines(lines, confidences));

describe('a manual that learns from its corrected pages', () => {
  it('no longer doubts a word that stands on two of them', () => {
    const unsure = page(['Set the discriminator again.'], { discriminator: 50 });
    expect(doubts(unsure)).toHaveLength(1);
    expect(doubts(taught(unsure, habitsFrom(vouching, [])))).toEqual([]);
    expect(doubts(taught(unsure, habitsFrom(vouching.slice(0, 1), [])))).toHaveLength(1);
  });

  it('proposes the known word that a doubtful one looks like', () => {
    const bent = page(['Set the discrlminator again.'], { discrlminator: 50 });
    expect(doubts(taught(bent, habitsFrom(vouching, [])))).toMatchObject([{ proposals: ['discriminator'] }]);
  });

  it('doubts what was corrected elsewhere, with what it was made into, however sure the reading is', () => {
    const read = readingOfLines(['Trim the tnmmer slowly.']);
    const lesson = lessonsOf(corrected(read, 'tnmmer', 'trimmer'), read);
    expect(lesson.corrections).toEqual([{ read: 'tnmmer', meant: 'trimmer', times: 1 }]);
    const elsewhere = taught(page(['The tnmmer, again.']), habitsFrom([lesson], []));
    expect(doubts(elsewhere)).toEqual([{ text: 'tnmmer,', reason: 'corrected-elsewhere', proposals: ['trimmer,'] }]);
  });

  it('lets a unit of its own stand as it was read', () => {
    const usual = page(['C14 is 100 uuf mica, C15 is 47 kc.']);
    const guessed = JSON.parse(
      JSON.stringify(usual).replace(
        /"text":"uuf","marks":\[(\{[^}]*\}[^}]*\})/,
        '"text":"µµf","marks":[$1,{"type":"doubt","attrs":{"reason":"sign-guessed","proposals":["uuf"]}}',
      ),
    ) as PageDocument;
    expect(doubts(guessed)).toHaveLength(1);
    const own = taught(guessed, habitsFrom([], ['uuf']));
    expect(doubts(own)).toEqual([]);
    expect(JSON.stringify(own)).toContain('"text":"uuf"');
    expect(doubts(taught(guessed, habitsFrom([], [])))).toHaveLength(1);
  });

  it('learns nothing from a word that is still in doubt, nor from plain numbers', () => {
    const read = readingOfLines(['Feed 455 to the grid'], { grid: 40 });
    expect(lessonsOf(documentOf(read), read).words).toEqual(['Feed', 'the']);
  });
});
