import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { everybody } from '#src/api/people.ts';
import { me } from '#src/api/session.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';
import { InviteDialog } from './invite-dialog.tsx';
import { PeopleTable } from './people-table.tsx';

export function People() {
  const { data: people, error, isPending, refetch } = useQuery(everybody);
  const { data: person } = useQuery(me);
  const [isInviting, setInviting] = useState(false);
  const inviteButton = (
    <Button look="main" onClick={() => setInviting(true)}>
      Invite somebody
    </Button>
  );
  const count = (state: string): string => String(people?.filter((each) => each.state === state).length ?? 0);
  return (
    <>
      <TitleBlock
        kind="Who may come in"
        title="People"
        cells={[
          { label: 'Active', value: count('active'), isFigure: true, stays: true },
          { label: 'Invited', value: count('invited'), isFigure: true, stays: true },
          { label: 'Barred', value: count('barred'), isFigure: true, stays: true },
        ]}
      />
      <div className="my-4 flex justify-end">{people?.length === 0 ? null : inviteButton}</div>
      {isPending ? <Pending what="Fetching the list …" /> : null}
      {error === null || people !== undefined ? null : (
        <Failure what="The list could not be fetched" error={error} onRetry={() => void refetch()} />
      )}
      {people?.length === 0 ? <Empty title="Nobody is here yet" action={inviteButton} /> : null}
      {people === undefined || people.length === 0 ? null : <PeopleTable people={people} myId={person?.id} />}
      <InviteDialog isOpen={isInviting} onOpenChange={setInviting} />
    </>
  );
}
