import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';
import { ShapeMark, type Shape } from './state-word.tsx';

export type NoticeKind = 'info' | 'doubt' | 'alarm' | 'good';

const looks: Record<NoticeKind, { box: string; ink: string; shape: Shape }> = {
  info: { box: 'border-l-2 border-signal', ink: 'text-signal', shape: 'dot' },
  doubt: { box: 'border-l-2 border-doubt bg-doubt-wash', ink: 'text-doubt', shape: 'question' },
  alarm: { box: 'border-l-4 border-double border-alarm bg-alarm-wash', ink: 'text-alarm', shape: 'cross' },
  good: { box: 'border-l-2 border-good bg-good-wash', ink: 'text-good', shape: 'tick' },
};

type Props = {
  kind?: NoticeKind;
  title?: ReactNode;
  children?: ReactNode;
  /** What can be done about it. */
  action?: ReactNode;
  /** Read out as soon as it appears. */
  isUrgent?: boolean;
  className?: string;
};

/** A note in the margin of what happened. An alarm is told by its double rule as well as by its ink. */
export function Notice({ kind = 'info', title, children, action, isUrgent = kind === 'alarm', className }: Props) {
  const { box, ink, shape } = looks[kind];
  return (
    <div
      role={isUrgent ? 'alert' : undefined}
      className={cx('flex flex-wrap items-start gap-x-4 gap-y-2 px-3 py-2', box, className)}
    >
      <div className="min-w-0 flex-1 basis-60">
        {title === undefined ? null : (
          <p className={cx('flex items-baseline gap-2 font-semibold', ink)}>
            <ShapeMark shape={shape} />
            {title}
          </p>
        )}
        {children === undefined ? null : <div className="text-ink">{children}</div>}
      </div>
      {action}
    </div>
  );
}
