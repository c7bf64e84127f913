import { Slot } from 'radix-ui';
import type { ComponentProps } from 'react';
import { cx } from '#src/lib/class-names.ts';

export type ButtonLook = 'main' | 'plain' | 'quiet' | 'danger';

const base =
  'inline-flex min-h-8 items-center justify-center gap-2 rounded-sm border py-1 text-body leading-5 no-underline select-none transition-colors ' +
  'disabled:opacity-55 aria-disabled:opacity-55';

const looks: Record<ButtonLook, string> = {
  main: 'px-3 border-signal bg-signal font-semibold text-leaf hover:bg-ink hover:border-ink',
  plain: 'px-3 border-edge bg-leaf text-ink hover:border-ink hover:bg-paper',
  quiet:
    'border-x-0 border-transparent bg-transparent text-signal underline decoration-1 underline-offset-3 hover:decoration-2',
  danger: 'px-3 border-alarm bg-leaf text-alarm hover:bg-alarm hover:text-leaf',
};

type Props = ComponentProps<'button'> & {
  look?: ButtonLook;
  /** Lends the look to its one child, a link say. */
  asChild?: boolean;
  /** Words to show while the thing is being done; the button cannot be pressed meanwhile. */
  busy?: string | false | undefined;
};

export function Button({
  look = 'plain',
  asChild = false,
  busy = false,
  className,
  children,
  disabled,
  ...rest
}: Props) {
  const classes = cx(base, looks[look], className);
  if (asChild) {
    return (
      <Slot.Root className={classes} {...rest}>
        {children}
      </Slot.Root>
    );
  }
  const isBusy = busy !== false;
  return (
    <button
      type="button"
      className={classes}
      disabled={disabled === true || isBusy}
      aria-busy={isBusy || undefined}
      {...rest}
    >
      {isBusy ? busy : children}
    </button>
  );
}
