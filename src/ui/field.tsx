import { type ComponentProps, type ReactNode, useId } from 'react';
import { cx } from '#src/lib/class-names.ts';

export const inputLook =
  'block min-h-9 w-full min-w-0 rounded-sm border border-edge bg-leaf px-2 py-1 text-ink placeholder:text-pencil ' +
  'aria-invalid:border-alarm aria-invalid:border-2 disabled:opacity-55';

type FrameProps = {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  className?: string | undefined;
  children: (wiring: { id: string; 'aria-describedby'?: string; 'aria-invalid'?: true }) => ReactNode;
};

/** A label, what it labels, a hint and what is wrong with it, tied together for every way of reading. */
export function FieldFrame({ label, hint, error, className, children }: FrameProps) {
  const id = useId();
  const notes = [hint === undefined ? null : `${id}-hint`, error === undefined ? null : `${id}-error`]
    .filter(Boolean)
    .join(' ');
  return (
    <div className={cx('mb-3', className)}>
      <label htmlFor={id} className="mb-1 block leading-5 font-semibold">
        {label}
      </label>
      {children({
        id,
        ...(notes === '' ? {} : { 'aria-describedby': notes }),
        ...(error === undefined ? {} : { 'aria-invalid': true as const }),
      })}
      {hint === undefined ? null : (
        <p id={`${id}-hint`} className="mt-1 text-small text-pencil">
          {hint}
        </p>
      )}
      {error === undefined ? null : (
        <p id={`${id}-error`} role="alert" className="mt-1 text-small font-semibold text-alarm">
          {error}
        </p>
      )}
    </div>
  );
}

type Shared = { label: ReactNode; hint?: ReactNode; error?: string | undefined; frame?: string };

export function Field({ label, hint, error, frame, className, ...input }: Shared & ComponentProps<'input'>) {
  return (
    <FieldFrame label={label} hint={hint} error={error} className={frame}>
      {(wiring) => <input {...wiring} {...input} className={cx(inputLook, className)} />}
    </FieldFrame>
  );
}

export function TextArea({ label, hint, error, frame, className, ...input }: Shared & ComponentProps<'textarea'>) {
  return (
    <FieldFrame label={label} hint={hint} error={error} className={frame}>
      {(wiring) => <textarea rows={3} {...wiring} {...input} className={cx(inputLook, className)} />}
    </FieldFrame>
  );
}

export function Select({
  label,
  hint,
  error,
  frame,
  className,
  children,
  ...input
}: Shared & ComponentProps<'select'>) {
  return (
    <FieldFrame label={label} hint={hint} error={error} className={frame}>
      {(wiring) => (
        <select {...wiring} {...input} className={cx(inputLook, className)}>
          {children}
        </select>
      )}
    </FieldFrame>
  );
}
