import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

/** The sheet of a screen: as wide as reads well, with air at the edges. */
export const Screen = ({ children, className }: { children: ReactNode; className?: string }) => (
  <div className={cx('mx-auto w-full max-w-[1240px] px-4 pt-4 pb-12 sm:px-6', className)}>{children}</div>
);

/** A heading within a screen, its buttons at the other end of the line. */
export function SectionHead({ title, children, id }: { title: ReactNode; children?: ReactNode; id?: string }) {
  return (
    <div className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-2">
      <h2 id={id} className="font-serif text-lead font-semibold">
        {title}
      </h2>
      {children === undefined ? null : <div className="flex flex-wrap items-center gap-x-3 gap-y-2">{children}</div>}
    </div>
  );
}
