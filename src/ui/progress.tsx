import { cx } from '#src/lib/class-names.ts';

/** A length of rule, inked as far as the work has come. The words beside it say the same. */
export function Progress({
  label,
  part,
  whole,
  className,
}: {
  label: string;
  part: number;
  whole: number;
  className?: string;
}) {
  const share = whole === 0 ? 0 : Math.min(1, part / whole);
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={whole}
      aria-valuenow={Math.min(part, whole)}
      className={cx('relative h-1 border-b border-edge', className)}
    >
      <div
        className="absolute inset-y-0 left-0 -bottom-px bg-signal transition-[width]"
        style={{ width: `${share * 100}%` }}
      />
    </div>
  );
}
