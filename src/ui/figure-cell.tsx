import { cx } from '#src/lib/class-names.ts';

/** A written number: what stands left of its point, the point and what follows, and the rest, mostly a unit. */
const numberParts = /^([-+−±]?\d[\d\s,]*|[-+−±]?(?=\.))(\.\d+)?(.*)$/s;

type Parts = { whole: string; fraction: string; rest: string };

function partsOf(text: string): Parts | null {
  const match = numberParts.exec(text.trim());
  if (match === null) return null;
  const [, whole = '', fraction = '', rest = ''] = match;
  return { whole: whole.trimEnd(), fraction, rest: rest.trim() };
}

export type Room = { left: number; right: number };

/** The room that a column of numbers needs on each side of the point. */
export function roomFor(texts: readonly string[]): Room {
  const parts = texts.map(partsOf).filter((each) => each !== null);
  return {
    left: Math.max(1, ...parts.map(({ whole }) => whole.length)),
    right: Math.max(0, ...parts.map(({ fraction }) => fraction.length)),
  };
}

type Props = { text: string; unit?: string; room?: Room; className?: string };

/** A number for a column: its point stands where its neighbours' does; its unit is lighter, after a thin space. */
export function FigureCell({ text, unit, room = { left: 1, right: 0 }, className }: Props) {
  const parts = partsOf(text);
  if (parts === null) return <span className={cx('figures', className)}>{text}</span>;
  return (
    <span className={cx('figures inline-flex whitespace-pre', className)}>
      <span className="text-right" style={{ minWidth: `${room.left}ch` }}>
        {parts.whole}
      </span>
      <span style={{ minWidth: `${room.right}ch` }}>{parts.fraction}</span>
      <Unit>{parts.rest === '' ? (unit ?? '') : parts.rest}</Unit>
    </span>
  );
}

/** A unit after its number. */
export const Unit = ({ children }: { children: string }) =>
  children === '' ? null : <span className="font-light text-pencil">{`\u2009${children}`}</span>;
