import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { manualsOnShelf } from '#src/api/manuals.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { ManualsTable } from './manuals-table.tsx';
import { matching } from './matching.ts';

type Props = {
  filter: string;
  onClearFilter: () => void;
  /** The way to add the first manual, for those who may. */
  addButton?: ReactNode;
};

/** All manuals that are not in the bin. */
export function Shelf({ filter, onClearFilter, addButton }: Props) {
  const { data: manuals, error, isPending, refetch } = useQuery(manualsOnShelf);
  if (isPending) return <Pending what="Fetching the manuals …" />;
  if (manuals === undefined)
    return <Failure what="The manuals could not be fetched" error={error} onRetry={() => void refetch()} />;
  if (manuals.length === 0) return <EmptyShelf addButton={addButton} />;
  const shown = matching(manuals, filter);
  return (
    <>
      <p role="status" className={filter === '' ? 'sr-only' : 'mb-2 text-pencil'}>
        {filter === '' ? '' : `${shown.length} of ${manuals.length} manuals`}
      </p>
      {shown.length === 0 ? (
        <Empty
          title={`No manual has “${filter}” in its record`}
          action={<Button onClick={onClearFilter}>Show all manuals</Button>}
        >
          This filter looks at titles, equipment, makers and document numbers. To look inside the pages, search from the
          top of the screen.
        </Empty>
      ) : (
        <ManualsTable manuals={shown} caption="Manuals" />
      )}
    </>
  );
}

const EmptyShelf = ({ addButton }: { addButton?: ReactNode }) =>
  addButton === undefined || addButton === null ? (
    <Empty title="No manual has been added yet">
      An archivist adds manuals. As soon as one is here you can read and search it.
    </Empty>
  ) : (
    <Empty title="Add the first manual" action={addButton}>
      Give it a title and its scan: a PDF, or pictures of the pages. The pages are read here, on this machine, one after
      the other; you can start to correct the first while the last is still waiting.
    </Empty>
  );
