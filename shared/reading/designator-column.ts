import { designatorsLike, isDesignator } from './designators.ts';
import type { Mended } from './mended.ts';
import type { ReadingWord } from './reading.ts';

type Cells = readonly (readonly ReadingWord[])[];
type Name = { letters: string; number: number };
type Around = { last: Name | null; next: Name | null };

/** A list leaves out numbers, but seldom more in a row. */
const widestGap = 40;

/** Mends a column of designators: letters are capitals, figures are figures, and numbers rise down the list. */
export function mendDesignators(cells: Cells): Map<ReadingWord, Mended> {
  const changes = new Map<ReadingWord, Mended>();
  let last: Name | null = null;
  cells.forEach((cell, row) => {
    const next = nextName(cells, row);
    cell.forEach((word, at) => {
      const mended = mendedParts(word.text, last, next);
      const whole = at === cell.length - 1 ? mended.replace(/[,.;:]+$/, '') : mended;
      const text = cell.length === 1 ? (missingBetween(word, { last, next }, whole) ?? whole) : whole;
      if (text !== word.text) changes.set(word, { text, sure: text === word.text.toUpperCase() });
      last = lastNameOf(text) ?? last;
    });
  });
  return changes;
}

/** Below this a designator that does not fit is not believed. */
const unreadableBelow = 60;

/** What cannot be read, between two names that leave out just one, is that one: as a guess. */
function missingBetween({ confidence }: ReadingWord, { last, next }: Around, whole: string): string | null {
  if (confidence >= unreadableBelow || last === null || next === null || last.letters !== next.letters) return null;
  const own = nameOf(whole);
  const fits = own !== null && own.letters === last.letters && own.number > last.number && own.number < next.number;
  return !fits && next.number - last.number === 2 ? `${last.letters}${last.number + 1}` : null;
}

/** "C103,c107" and "R1-R4": each name on its own, the signs between kept. */
function mendedParts(text: string, last: Name | null, next: Name | null): string {
  let before = last;
  return text
    .split(/([,;–-])/)
    .map((part) => {
      if (part === '' || /^[,;–-]$/.test(part)) return part === ';' ? ',' : part;
      const chosen = chosenFrom(designatorsLike(part), before, next) ?? part;
      before = nameOf(chosen) ?? before;
      return chosen;
    })
    .join('')
    .replace(/^[-,]+(?=[A-Z])/, '');
}

/** The likeliest reading that goes on from the name before and comes before the next; else the likeliest. */
function chosenFrom(candidates: readonly string[], last: Name | null, next: Name | null): string | undefined {
  const inOrder = candidates.filter((each) => {
    const name = nameOf(each);
    if (name === null || last === null || name.letters !== last.letters) return false;
    const isBeforeNext = next === null || next.letters !== name.letters || name.number < next.number;
    return name.number > last.number && name.number - last.number <= widestGap && isBeforeNext;
  });
  return inOrder[0] ?? candidates[0];
}

function nameOf(text: string): Name | null {
  const [, letters, number] = /^([A-Z]{1,2})(\d{1,4})/.exec(text) ?? [];
  return letters === undefined || !isDesignator(text) ? null : { letters, number: Number(number) };
}

const lastNameOf = (text: string): Name | null =>
  nameOf(
    text
      .split(/[,;–-]/)
      .filter(Boolean)
      .at(-1) ?? '',
  );
/** The first name of the row below, mended if that leaves no choice. */
const nextName = (cells: Cells, row: number): Name | null => firstNameOf(cells[row + 1]);
const firstNameOf = (cell: readonly ReadingWord[] | undefined): Name | null =>
  nameOf((cell?.[0]?.text ?? '').split(/[,;–-]/)[0] ?? '');
