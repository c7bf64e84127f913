import { diffWordsWithSpace } from 'diff';

/** A stretch of text that stands in both, only in the older, or only in the newer. */
export type Piece = { kind: 'same' | 'gone' | 'new'; text: string };

export const compareWords = (older: string, newer: string): Piece[] =>
  diffWordsWithSpace(older, newer).map(({ value, added, removed }) => ({
    kind: added ? 'new' : removed ? 'gone' : 'same',
    text: value,
  }));
