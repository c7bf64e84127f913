import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Quantity } from '#shared/api/quantities.ts';
import { quantitiesOfManual } from '#src/api/quantities.ts';
import { useCan } from '#src/api/session.ts';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { SectionHead } from '#src/ui/screen.tsx';
import { DeleteQuantity } from './delete-quantity.tsx';
import { QuantitiesTable } from './quantities-table.tsx';
import { QuantityDialog } from './quantity-dialog.tsx';
import { ValueProblems } from './value-problems.tsx';

type Work = { do: 'add' } | { do: 'edit' | 'delete'; quantity: Quantity } | null;

/** The named numbers of the manual: what each depends on, what was printed, and whether its proof holds. */
export function ValuesSheet({ manualId }: { manualId: string }) {
  const { data: quantities, error, isPending, refetch } = useQuery(quantitiesOfManual(manualId));
  if (isPending) return <Pending what="Fetching the values …" />;
  if (quantities === undefined)
    return <Failure what="The values could not be fetched" error={error} onRetry={() => void refetch()} />;
  return <Values manualId={manualId} quantities={quantities} />;
}

function Values({ manualId, quantities }: { manualId: string; quantities: readonly Quantity[] }) {
  const [work, setWork] = useState<Work>(null);
  const mayEdit = useCan('edit-quantities');
  const isEmpty = quantities.length === 0;
  const addButton = mayEdit ? (
    <Button look={isEmpty ? 'main' : 'plain'} onClick={() => setWork({ do: 'add' })}>
      Add a quantity
    </Button>
  ) : null;
  const deeds = {
    onEdit: (quantity: Quantity) => setWork({ do: 'edit', quantity }),
    onDelete: (quantity: Quantity) => setWork({ do: 'delete', quantity }),
  };
  return (
    <>
      {isEmpty ? (
        <Empty title="No number of this manual is live yet" action={addButton}>
          A quantity is a named number: an input that is set at the bench, a constant of the equipment, or one that is
          worked out from others. Begin with an input, the channel say.
        </Empty>
      ) : (
        <>
          <SectionHead title={counted(quantities.length, 'quantity', 'quantities')}>{addButton}</SectionHead>
          <ValueProblems manualId={manualId} />
          <QuantitiesTable manualId={manualId} quantities={quantities} {...(mayEdit ? deeds : {})} />
        </>
      )}
      <WorkDialog manualId={manualId} work={work} onClose={() => setWork(null)} />
    </>
  );
}

function WorkDialog({ manualId, work, onClose }: { manualId: string; work: Work; onClose: () => void }) {
  if (work === null) return null;
  if (work.do === 'add') return <QuantityDialog manualId={manualId} onClose={onClose} />;
  return work.do === 'edit' ? (
    <QuantityDialog manualId={manualId} quantity={work.quantity} onClose={onClose} />
  ) : (
    <DeleteQuantity manualId={manualId} quantity={work.quantity} onClose={onClose} />
  );
}
