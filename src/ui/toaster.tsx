import { Toaster as Parts } from 'sonner';

/** Where words about what was just done appear, and are read out. */
export const Toaster = () => (
  <Parts
    position="bottom-right"
    offset={16}
    gap={8}
    expand
    visibleToasts={3}
    toastOptions={{
      unstyled: true,
      classNames: {
        toast:
          'flex w-[min(360px,calc(100vw-32px))] items-center gap-3 rounded-sm border-2 border-ink bg-leaf px-3 py-2 font-sans text-body text-ink',
        title: 'font-normal',
        description: 'text-small text-pencil',
        actionButton: 'word-link shrink-0 ml-auto',
        error: 'border-alarm',
      },
    }}
  />
);
