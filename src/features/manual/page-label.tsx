import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { PageSummary } from '#shared/api/pages.ts';
import { relabelPage } from '#src/api/pages.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { inputLook } from '#src/ui/field.tsx';

const longestLabel = 40;

/** The printed number of a page, to be typed over. Kept when the field is left or Enter is pressed; Escape takes it back. */
export function PageLabel({ manualId, page }: { manualId: string; page: PageSummary }) {
  const [text, setText] = useState(page.label);
  const { mutate, isPending, error } = useMutation(relabelPage(useQueryClient(), manualId));
  const keep = (): void => {
    const label = text.trim();
    if (label === '') setText(page.label);
    else if (label !== page.label) mutate({ pageId: page.id, label });
  };
  return (
    <div className="min-w-0 flex-1">
      <input
        value={text}
        maxLength={longestLabel}
        aria-label={`Label of page ${page.position}`}
        aria-invalid={error !== null || undefined}
        aria-busy={isPending || undefined}
        className={`${inputLook} figures`}
        onChange={({ currentTarget }) => setText(currentTarget.value)}
        onBlur={keep}
        onKeyDown={(event) => {
          if (event.key === 'Enter') keep();
          if (event.key === 'Escape') setText(page.label);
        }}
      />
      {error === null ? null : (
        <p role="alert" className="mt-1 text-small text-alarm">
          {saidBy(error)}
        </p>
      )}
    </div>
  );
}
