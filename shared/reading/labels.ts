import type { Zone } from '#shared/document/define-block.ts';
import { overlap } from './picture/figures.ts';
import type { ReadingWord } from './reading.ts';

/** Two words are of the same print when one covers so much of the other. */
const samePrint = 0.3;
/** A label that the page's reading did not have must be as sure as this: strokes of a drawing read as letters too. */
const surelyLabel = 60;

/**
 * The lettering of a drawing, from the page's reading and one of the drawing on its own: where both have the same print
 * the surer one stays, and what only the second has is taken when it is sure.
 */
export function mergedLabels(words: readonly ReadingWord[], labels: readonly ReadingWord[], zone: Zone): ReadingWord[] {
  const inside = words.filter(({ box }) => overlap(box, zone) > 0.5);
  const gone = new Set<ReadingWord>();
  const taken: ReadingWord[] = [];
  let line = Math.max(0, ...words.map((word) => word.line));
  for (const label of labels) {
    const same = inside.filter(({ box }) => overlap(box, label.box) > samePrint || overlap(label.box, box) > samePrint);
    if (!isBetter(label, same)) continue;
    for (const word of same) gone.add(word);
    line += 1;
    taken.push({ ...label, line });
  }
  return [...words.filter((word) => !gone.has(word)), ...taken];
}

function isBetter(label: ReadingWord, same: readonly ReadingWord[]): boolean {
  const isWordy = /[A-Za-z0-9]/.test(label.text);
  if (same.length === 0) return isWordy && label.confidence >= surelyLabel;
  return isWordy && same.every(({ confidence }) => label.confidence > confidence);
}
