import { Tabs as Parts } from 'radix-ui';
import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

export type Tab = { value: string; label: ReactNode };

type Props = {
  label: string;
  tabs: readonly Tab[];
  value: string;
  onValueChange: (value: string) => void;
  children: ReactNode;
  className?: string;
};

/** Index tabs, as on the dividers of a card drawer: the one in front is open towards its sheet. */
export function Tabs({ label, tabs, value, onValueChange, children, className }: Props) {
  return (
    <Parts.Root value={value} onValueChange={onValueChange} className={className}>
      <Parts.List aria-label={label} className="screen-only flex flex-wrap gap-x-1 border-b border-ink">
        {tabs.map((tab) => (
          <Parts.Trigger
            key={tab.value}
            value={tab.value}
            className={cx(
              '-mb-px min-h-9 rounded-t-sm border border-transparent px-3 py-1 text-pencil hover:text-ink focus-visible:z-10',
              'data-[state=active]:border-ink data-[state=active]:border-b-paper data-[state=active]:bg-paper data-[state=active]:font-semibold data-[state=active]:text-ink',
            )}
          >
            {tab.label}
          </Parts.Trigger>
        ))}
      </Parts.List>
      {children}
    </Parts.Root>
  );
}

export function TabSheet({ value, children }: { value: string; children: ReactNode }) {
  return (
    <Parts.Content value={value} className="pt-4">
      {children}
    </Parts.Content>
  );
}
