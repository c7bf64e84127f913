import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { counted } from '#shared/kit/counted.ts';
import { relabelPage } from '#src/api/pages.ts';
import { pageNumbersIn } from '#src/api/page-numbers.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { toast } from '#src/ui/toast.ts';

/** What the pages print as their numbers: gaps and doubles, and the way to take them as labels. */
export function PageNumbers({ manualId }: { manualId: string }) {
  const client = useQueryClient();
  const { data } = useQuery(pageNumbersIn(manualId));
  const relabel = useMutation(relabelPage(client, manualId));
  const [isBusy, setBusy] = useState(false);
  if (data === undefined) return null;
  const others = data.pages.filter(({ label, printed }) => printed !== null && printed !== label.toLowerCase());
  const take = async (): Promise<void> => {
    setBusy(true);
    try {
      for (const { pageId, printed } of others) await relabel.mutateAsync({ pageId, label: printed ?? '' });
      toast(`${counted(others.length, 'page')} labelled as printed.`);
    } catch (error) {
      toast.error(saidBy(error));
    } finally {
      setBusy(false);
      await client.invalidateQueries({ queryKey: pageNumbersIn(manualId).queryKey });
    }
  };
  return (
    <section aria-label="Printed page numbers" className="screen-only mb-5 border-l-2 border-signal pl-3">
      <p>{found(data.pages)}</p>
      {data.problems.map(({ pageId, says }) => (
        <p key={`${pageId} ${says}`} className="text-doubt">
          <span aria-hidden="true">? </span>
          {says}
        </p>
      ))}
      {others.length === 0 ? null : (
        <Button className="mt-2" busy={isBusy && 'Labelling …'} onClick={() => void take()}>
          {`Label ${counted(others.length, 'page')} as printed`}
        </Button>
      )}
    </section>
  );
}

function found(pages: readonly { printed: string | null }[]): string {
  const printed = pages.filter((page) => page.printed !== null).length;
  return `${printed} of ${counted(pages.length, 'page')} that ${pages.length === 1 ? 'is' : 'are'} read print a page number.`;
}
