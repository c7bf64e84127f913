import { DropdownMenu as Parts } from 'radix-ui';
import type { ComponentProps, ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

type Props = { trigger: ReactNode; children: ReactNode; align?: 'start' | 'end' };

export function Menu({ trigger, children, align = 'end' }: Props) {
  return (
    <Parts.Root modal={false}>
      <Parts.Trigger asChild>{trigger}</Parts.Trigger>
      <Parts.Portal>
        <Parts.Content
          align={align}
          sideOffset={4}
          collisionPadding={8}
          className="z-40 min-w-52 rounded-sm border-2 border-ink bg-leaf py-1"
        >
          {children}
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

const itemLook =
  'flex min-h-9 cursor-pointer items-center gap-2 px-3 py-1 outline-none data-highlighted:bg-ink data-highlighted:text-leaf data-disabled:opacity-55';

export const MenuItem = ({ className, ...rest }: ComponentProps<typeof Parts.Item>) => (
  <Parts.Item className={cx(itemLook, className)} {...rest} />
);

export const MenuLabel = ({ children }: { children: ReactNode }) => (
  <Parts.Label className="px-3 py-1 text-small text-pencil">{children}</Parts.Label>
);

export const MenuRule = () => <Parts.Separator className="my-1 h-px bg-rule" />;

type ChoiceProps<T extends string> = {
  label: string;
  value: T;
  choices: readonly { value: T; label: string }[];
  onValueChange: (value: T) => void;
};

export function MenuChoice<T extends string>({ label, value, choices, onValueChange }: ChoiceProps<T>) {
  return (
    <Parts.RadioGroup
      aria-label={label}
      value={value}
      onValueChange={(next) => {
        const chosen = choices.find((choice) => choice.value === next);
        if (chosen !== undefined) onValueChange(chosen.value);
      }}
    >
      <MenuLabel>{label}</MenuLabel>
      {choices.map((choice) => (
        <Parts.RadioItem
          key={choice.value}
          value={choice.value}
          onSelect={(event) => event.preventDefault()}
          className={cx(itemLook, 'pl-8')}
        >
          <Parts.ItemIndicator className="-ml-5 w-3" aria-hidden="true">
            •
          </Parts.ItemIndicator>
          {choice.label}
        </Parts.RadioItem>
      ))}
    </Parts.RadioGroup>
  );
}
