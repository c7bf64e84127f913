import type { ReactNode } from 'react';

type Stretch = { text: string; isMarked: boolean; at: number };

/** Cuts a text at its marks. Marks that overlap, stand in any order or reach too far do no harm. */
export function stretches(text: string, marks: readonly (readonly [number, number])[]): Stretch[] {
  const parts: Stretch[] = [];
  let at = 0;
  const add = (end: number, isMarked: boolean): void => {
    if (end > at) parts.push({ text: text.slice(at, end), isMarked, at });
    at = Math.max(at, end);
  };
  for (const [start, end] of [...marks].sort(([a], [b]) => a - b)) {
    add(Math.min(start, text.length), false);
    add(Math.min(end, text.length), true);
  }
  add(text.length, false);
  return parts;
}

/** A snippet with what was looked for under the marker pen. */
export const MarkedText = ({
  text,
  marks,
}: {
  text: string;
  marks: readonly (readonly [number, number])[];
}): ReactNode =>
  stretches(text, marks).map((part) =>
    part.isMarked ? <mark key={part.at}>{part.text}</mark> : <span key={part.at}>{part.text}</span>,
  );
