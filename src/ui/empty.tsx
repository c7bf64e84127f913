import type { ReactNode } from 'react';

/** An empty sheet: what to do first, and the one press that does it. */
export function Empty({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="border-y border-rule py-10 sm:px-8">
      <h2 className="font-serif text-lead font-semibold">{title}</h2>
      {children === undefined ? null : <div className="mt-2 max-w-[60ch] text-pencil">{children}</div>}
      {action === undefined ? null : <div className="mt-4 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}
