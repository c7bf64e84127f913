import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { counted } from '#shared/kit/counted.ts';
import { signPage, takeBackSignature } from '#src/api/revisions.ts';
import { me } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { toast } from '#src/ui/toast.ts';

type Props = { page: Page; /** What stands on the screen is no revision yet. */ hasUnsaved?: boolean };

/** Why the page cannot be signed off by this person now; null where it can. */
function objection({ page, hasUnsaved, personId }: { page: Page; hasUnsaved: boolean; personId: string }) {
  if (page.authorIds.includes(personId)) return 'You wrote this text: another editor signs it off.';
  return hasUnsaved ? 'Save the text before it is signed off.' : null;
}

/** Signing a page off as proofed, and the way back, for those who may correct pages. */
export function ReviewDeeds({ page, hasUnsaved = false }: Props) {
  const { data: person } = useQuery(me);
  const { revision, state } = page;
  if (person === undefined || person === null || revision === 0) return null;
  if (state === 'proofed') return <TakeBack page={page} />;
  if (state !== 'corrected' && state !== 'read') return null;
  const against = objection({ page, hasUnsaved, personId: person.id });
  return against === null ? <SignOff page={page} /> : <p className="text-small text-pencil">{against}</p>;
}

function TakeBack({ page: { id, label } }: { page: Page }) {
  const { mutate, isPending } = useMutation(takeBackSignature(useQueryClient(), id));
  return (
    <Button
      busy={isPending && 'Taking it back …'}
      onClick={() =>
        mutate(undefined, {
          onSuccess: () => toast(`Page ${label} is no longer signed off.`),
          onError: (error) => toast.error(saidBy(error)),
        })
      }
    >
      Take the signature back
    </Button>
  );
}

function SignOff({ page: { id, label, revision, doubtCount } }: { page: Page }) {
  const sign = useMutation(signPage(useQueryClient(), id));
  const [isAsking, setAsking] = useState(false);
  const put = (): void =>
    sign.mutate(
      { revision, doubts: doubtCount },
      {
        onSuccess: () => {
          setAsking(false);
          toast(`Page ${label} is signed off as proofed.`);
        },
        onError: (error) => {
          setAsking(false);
          toast.error(saidBy(error));
        },
      },
    );
  return (
    <>
      <Button busy={sign.isPending && 'Signing …'} onClick={doubtCount === 0 ? put : () => setAsking(true)}>
        Sign off as proofed
      </Button>
      <Dialog
        isOpen={isAsking}
        onOpenChange={setAsking}
        title={`Sign off with ${counted(doubtCount, 'doubt')} left?`}
        intro={`Page ${label} still has ${counted(doubtCount, 'doubt')} that nobody has settled. The signature will say so.`}
      >
        <Actions>
          <Button look="main" busy={sign.isPending && 'Signing …'} onClick={put}>
            {`Sign off with ${counted(doubtCount, 'doubt')}`}
          </Button>
          <Button onClick={() => setAsking(false)}>Leave as it is</Button>
        </Actions>
      </Dialog>
    </>
  );
}
