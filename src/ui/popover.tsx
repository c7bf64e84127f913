import { Popover as Parts } from 'radix-ui';
import type { ReactNode } from 'react';

export function Popover({ trigger, label, children }: { trigger: ReactNode; label: string; children: ReactNode }) {
  return (
    <Parts.Root>
      <Parts.Trigger asChild>{trigger}</Parts.Trigger>
      <Parts.Portal>
        <Parts.Content
          aria-label={label}
          sideOffset={6}
          collisionPadding={8}
          className="z-40 w-[min(420px,calc(100vw-16px))] rounded-sm border-2 border-ink bg-leaf px-4 py-3"
        >
          {children}
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}
