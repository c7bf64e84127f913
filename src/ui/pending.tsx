import { cx } from '#src/lib/class-names.ts';

const widths = ['w-full', 'w-11/12', 'w-full', 'w-4/5', 'w-full', 'w-2/3'];

/** Said while something is fetched: words for those who listen, hairlines where the text will stand. */
export function Pending({ what, lines = 6, className }: { what: string; lines?: number; className?: string }) {
  return (
    <div role="status" className={cx('py-2', className)}>
      <p className="text-pencil">{what}</p>
      <div aria-hidden="true" className="mt-4 grid gap-7">
        {Array.from({ length: lines }, (_, at) => (
          <div key={at} className={cx('pending-rule', widths[at % widths.length])} />
        ))}
      </div>
    </div>
  );
}

/** The same, within a line of text. */
export function BusyWords({ children }: { children: string }) {
  return (
    <span role="status" className="text-pencil">
      {children}
    </span>
  );
}
