import { designatorsIn } from '#shared/document/designator-list.ts';
import type { Mended } from './mended.ts';
import type { ReadingWord } from './reading.ts';

/** A cell of the quantity column and the designators it counts. */
export type CountedCell = { words: readonly ReadingWord[]; of: string };

/** What a lone 1 is read as, most of all from a typewriter. */
const oneLike = /^["'‘’]*[1Iil!|\][jtJ]{1,3}["'.,]*$/;
/** So many of the cells that can be checked must agree before the rest are held to it. */
const leastAgreeing = 0.85;
const fewestAgreeing = 5;
/** A count read with more confidence than this stands, whatever the designators say. */
const doubtfulBelow = 75;

/** Counts: figures only; and in a list whose counts are the numbers of its designators, doubtful ones follow those. */
export function mendCounts(cells: readonly CountedCell[]): Map<ReadingWord, Mended> {
  const changes = new Map<ReadingWord, Mended>();
  const follows = countsFollow(cells);
  for (const { words, of } of cells) {
    const [word] = words;
    if (word === undefined || words.length !== 1) continue;
    const text = figureIn(word.text);
    const counted = countOf(of);
    const isDoubtful = text === null || word.confidence < doubtfulBelow;
    if (follows && isDoubtful && counted !== null) changes.set(word, { text: String(counted), sure: false });
    else if (text !== null && text !== word.text) changes.set(word, { text, sure: /^\W?\d+\W?$/.test(word.text) });
  }
  return changes;
}

function figureIn(read: string): string | null {
  const figures = /^["'‘’(.,:]*(\d{1,3})["'.,:)]*$/.exec(read)?.[1];
  if (figures !== undefined) return figures;
  return oneLike.test(read) ? '1' : null;
}

function countsFollow(cells: readonly CountedCell[]): boolean {
  const checks = cells.flatMap(({ words, of }) => {
    const counted = countOf(of);
    const [word] = words;
    if (counted === null || word === undefined || !/^\d+$/.test(word.text) || word.confidence < doubtfulBelow)
      return [];
    return [Number(word.text) === counted];
  });
  const agreeing = checks.filter(Boolean).length;
  return agreeing >= fewestAgreeing && agreeing >= checks.length * leastAgreeing;
}

/** How many parts a cell of designators names: "C1" one, "C1, C4" two, "R1-R4" four. Null where that is not clear. */
export const countOf = (designators: string): number | null => designatorsIn(designators)?.length ?? null;
