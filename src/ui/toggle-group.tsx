import { ToggleGroup as Parts } from 'radix-ui';
import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

type Choice<T extends string> = { value: T; label: ReactNode };

type Props<T extends string> = {
  label: string;
  choices: readonly Choice<T>[];
  value: T;
  onValueChange: (value: T) => void;
  className?: string;
};

/** One of a few ways, side by side; one is always chosen. */
export function ToggleGroup<T extends string>({ label, choices, value, onValueChange, className }: Props<T>) {
  return (
    <Parts.Root
      type="single"
      aria-label={label}
      value={value}
      onValueChange={(next) => {
        const chosen = choices.find((choice) => choice.value === next);
        if (chosen !== undefined) onValueChange(chosen.value);
      }}
      className={cx('inline-flex flex-wrap rounded-sm border border-edge bg-leaf', className)}
    >
      {choices.map((choice) => (
        <Parts.Item
          key={choice.value}
          value={choice.value}
          className="min-h-8 border-l border-rule px-3 py-1 leading-5 text-ink first:border-l-0 hover:bg-paper focus-visible:z-10 data-[state=on]:bg-ink data-[state=on]:text-leaf"
        >
          {choice.label}
        </Parts.Item>
      ))}
    </Parts.Root>
  );
}
