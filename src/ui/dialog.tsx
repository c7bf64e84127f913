import { Dialog as Parts } from 'radix-ui';
import type { ReactNode } from 'react';
import { cx } from '#src/lib/class-names.ts';

type Props = {
  isOpen: boolean;
  onOpenChange: (isOpen: boolean) => void;
  title: string;
  /** One or two sentences on what this is about. */
  intro?: ReactNode;
  children: ReactNode;
  width?: 'narrow' | 'wide';
  trigger?: ReactNode;
};

/** The focus starts at what is to be filled in or decided, not at the way out. */
function startInBody(event: Event): void {
  const content = event.currentTarget;
  if (!(content instanceof HTMLElement)) return;
  const first = content.querySelector<HTMLElement>('[data-body] :is(input, textarea, select, button):not(:disabled)');
  if (first === null) return;
  event.preventDefault();
  first.focus();
}

/** The one thing that lies above the page. Escape and a press beside it close it; focus goes back where it was. */
export function Dialog({ isOpen, onOpenChange, title, intro, children, width = 'narrow', trigger }: Props) {
  return (
    <Parts.Root open={isOpen} onOpenChange={onOpenChange}>
      {trigger === undefined ? null : <Parts.Trigger asChild>{trigger}</Parts.Trigger>}
      <Parts.Portal>
        <Parts.Overlay className="fixed inset-0 z-40 bg-veil" />
        <Parts.Content
          {...(intro === undefined ? { 'aria-describedby': undefined } : {})}
          onOpenAutoFocus={startInBody}
          className={cx(
            'fixed inset-x-0 bottom-0 z-50 max-h-[92dvh] overflow-y-auto border-2 border-ink bg-leaf',
            'sm:inset-x-auto sm:top-1/2 sm:bottom-auto sm:left-1/2 sm:w-[calc(100vw-48px)] sm:-translate-x-1/2 sm:-translate-y-1/2 sm:rounded-sm',
            width === 'narrow' ? 'sm:max-w-[480px]' : 'sm:max-w-[760px]',
          )}
        >
          <header className="flex items-start justify-between gap-4 border-b border-ink px-4 py-3">
            <Parts.Title className="font-serif text-lead font-semibold">{title}</Parts.Title>
            <Parts.Close className="word-link shrink-0">Close</Parts.Close>
          </header>
          <div data-body className="px-4 pt-3 pb-4">
            {intro === undefined ? null : <Parts.Description className="mb-4 text-pencil">{intro}</Parts.Description>}
            {children}
          </div>
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

/** The row of buttons that ends a dialog or a form: the main one first. */
export function Actions({ children }: { children: ReactNode }) {
  return <div className="mt-5 flex flex-wrap items-center gap-x-3 gap-y-2">{children}</div>;
}
