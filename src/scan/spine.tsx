import { type KeyboardEvent, useState } from 'react';
import type { BoxKind, ScanBox } from './scan-boxes.ts';

export type SpineTick = {
  key: string;
  kind: 'block' | 'doubt' | 'live' | 'note';
  /** In pixels of the page. */ y: number;
  label: string;
};

const kindWords = { block: 'Block: ', doubt: 'Doubt: ', live: 'Live value: ', note: '' } as const;
const isTicked = (kind: BoxKind): kind is SpineTick['kind'] => kind in kindWords;

/** One tick for each comment, doubt, live value and block, those of words left out. */
export const ticksOf = (boxes: readonly ScanBox[], wordsAt: (key: string, kind: BoxKind) => string): SpineTick[] =>
  boxes
    .flatMap(({ key, box: [, y, , height], kind }): SpineTick[] =>
      isTicked(kind)
        ? [
            {
              ...{ key, kind, y: kind === 'block' ? y : y + height / 2 },
              label: `${kindWords[kind]}${wordsAt(key, kind)}`,
            },
          ]
        : [],
    )
    .sort((a, b) => a.y - b.y);

type Props = {
  ticks: readonly SpineTick[];
  height: number | null;
  active: string | null;
  onGo: (key: string) => void;
  onHover: (key: string | null) => void;
};

/** Between the leaves, to the scale of the page. One stop for Tab; the arrow keys go from tick to tick. */
export function Spine({ ticks, height, active, onGo, onHover }: Props) {
  const [stop, setStop] = useState(0);
  const at = Math.min(stop, ticks.length - 1);
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>): void => {
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    const next = Math.max(0, Math.min(ticks.length - 1, at + step));
    setStop(next);
    event.currentTarget.querySelectorAll('button')[next]?.focus();
  };
  return (
    <div
      role="toolbar"
      aria-orientation="vertical"
      aria-label="Spine: what stands where on the page"
      tabIndex={-1}
      className="spine screen-only"
      onKeyDown={onKeyDown}
    >
      {height === null
        ? null
        : ticks.map(({ key, kind, y, label }, index) => (
            <button
              key={`${kind}-${key}`}
              type="button"
              className="spine-tick"
              data-kind={kind}
              data-active={key === active || undefined}
              style={{ top: `${Math.min(100, Math.max(0, (y / height) * 100))}%` }}
              aria-label={label}
              title={label}
              tabIndex={index === at ? 0 : -1}
              onFocus={() => setStop(index)}
              onMouseEnter={() => onHover(key)}
              onMouseLeave={() => onHover(null)}
              onClick={() => onGo(key)}
            />
          ))}
    </div>
  );
}
