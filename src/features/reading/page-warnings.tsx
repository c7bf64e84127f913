import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Page } from '#shared/api/pages.ts';
import { type ReadingWarning, warningKinds } from '#shared/reading/page-warning.ts';
import { dividePage, joinPage } from '#src/api/pages.ts';
import { useCan } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { toast } from '#src/ui/toast.ts';

/** What is wrong with the picture of a page, what may be done about it, and the deed where there is one. */
export function PageWarnings({ page }: { page: Page }) {
  const mayRead = useCan('run-recognition');
  return (
    <div className="screen-only">
      {page.warnings.map((warning) => (
        <Notice
          key={warning.kind}
          kind="doubt"
          title={warningKinds[warning.kind].says}
          action={mayRead && warning.kind === 'double-page' ? <Divide page={page} warning={warning} /> : null}
        >
          {`${capital(warning.detail)}.`}
        </Notice>
      ))}
      {page.half === 'whole' ? null : <HalfNotice page={page} mayRead={mayRead} />}
    </div>
  );
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);
const hasBeenWorkedOn = ({ state }: Page): boolean => state === 'corrected' || state === 'proofed';

/** The warning says where the pages meet, in percent of the width. */
const cutIn = ({ detail }: ReadingWarning): number => Number(/(\d+) %/.exec(detail)?.[1] ?? 50) / 100;

function Divide({ page, warning }: { page: Page; warning: ReadingWarning }) {
  const { mutate, isPending } = useMutation(dividePage(useQueryClient(), page.manualId));
  return (
    <Button
      busy={isPending && 'Dividing …'}
      disabled={hasBeenWorkedOn(page)}
      onClick={() =>
        mutate(
          { pageId: page.id, cutShare: cutIn(warning) },
          {
            onSuccess: () => toast('Divided into two pages; both are being read.'),
            onError: (error) => toast.error(saidBy(error)),
          },
        )
      }
    >
      Divide into two pages
    </Button>
  );
}

function HalfNotice({ page, mayRead }: { page: Page; mayRead: boolean }) {
  const { mutate, isPending } = useMutation(joinPage(useQueryClient(), page.manualId));
  if (hasBeenWorkedOn(page) || !mayRead) return null;
  return (
    <Notice
      title={`This is the ${page.half} half of a picture that was divided.`}
      action={
        <Button
          busy={isPending && 'Joining …'}
          onClick={() =>
            mutate(page.id, {
              onSuccess: () => toast('The two halves are one page again, and it is being read.'),
              onError: (error) => toast.error(saidBy(error)),
            })
          }
        >
          Join the halves
        </Button>
      }
    />
  );
}
