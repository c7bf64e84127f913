import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

export type Tone = 'ink' | 'pencil' | 'signal' | 'doubt' | 'alarm' | 'good';
/** Drawn, not typed: no face has all of these, and each must be told from the others without colour. */
export type Shape = 'ring' | 'half' | 'dot' | 'tick' | 'double-tick' | 'cross' | 'question' | 'bars';

const inks: Record<Tone, string> = {
  ink: 'text-ink',
  pencil: 'text-pencil',
  signal: 'text-signal',
  doubt: 'text-doubt',
  alarm: 'text-alarm',
  good: 'text-good',
};

const strokes: Record<Shape, ReactNode> = {
  ring: <circle cx="6" cy="6" r="4" />,
  half: (
    <>
      <circle cx="6" cy="6" r="4" />
      <path d="M6 2a4 4 0 0 1 0 8z" fill="currentColor" />
    </>
  ),
  dot: <circle cx="6" cy="6" r="4" fill="currentColor" />,
  tick: <path d="M1.5 6.5 4.5 9.5 10.5 2.5" />,
  'double-tick': <path d="M.5 7 3 9.5 8 3M5 8.5 6 9.5 11.5 3" />,
  cross: <path d="M2 2 10 10M10 2 2 10" />,
  question: <path d="M3.5 4a2.5 2.5 0 1 1 3.6 2.3C6.3 6.7 6 7.1 6 8M6 10v1.2" />,
  bars: <path d="M4 2v8M8 2v8" />,
};

export function ShapeMark({ shape, className }: { shape: Shape; className?: string }) {
  return (
    <svg
      viewBox="0 0 12 12"
      aria-hidden="true"
      className={cx('size-3 shrink-0 translate-y-px fill-none stroke-current', className)}
      strokeWidth="1.6"
    >
      {strokes[shape]}
    </svg>
  );
}

type Props = { tone?: Tone; shape?: Shape; children: ReactNode; className?: string };

/** A state said three ways: a word, a shape and an ink. */
export function StateWord({ tone = 'ink', shape, children, className }: Props) {
  return (
    <span className={cx('inline-flex items-baseline gap-1.5', inks[tone], className)}>
      {shape === undefined ? null : <ShapeMark shape={shape} />}
      <span>{children}</span>
    </span>
  );
}
