import type { ComponentProps, ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

type Props = { caption: string; head: ReactNode; children: ReactNode; className?: string };

/** A table ruled like a parts list. Where it is wider than the screen it scrolls by itself, also by keyboard. */
export function RuledTable({ caption, head, children, className }: Props) {
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a region that scrolls must be reachable without a pointer
    <div role="region" aria-label={caption} tabIndex={0} className="relative overflow-x-auto">
      <table className={cx('w-full border-collapse border-y border-ink text-left', className)}>
        <caption className="sr-only">{caption}</caption>
        <thead className="border-b border-ink align-bottom">
          <tr>{head}</tr>
        </thead>
        <tbody className="divide-y divide-rule align-top">{children}</tbody>
      </table>
    </div>
  );
}

export const Th = ({ className, ...rest }: ComponentProps<'th'>) => (
  <th
    scope="col"
    className={cx('cell-label px-2 py-2 font-normal whitespace-nowrap first:pl-0 last:pr-0', className)}
    {...rest}
  />
);

export const Td = ({ className, ...rest }: ComponentProps<'td'>) => (
  <td className={cx('px-2 py-2 first:pl-0 last:pr-0', className)} {...rest} />
);
