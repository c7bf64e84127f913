import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Manual } from '#shared/api/manuals.ts';
import { manualsInBin, restoreManual } from '#src/api/manuals.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { toast } from '#src/ui/toast.ts';
import { ManualsTable } from './manuals-table.tsx';

/** What was put aside. Nothing leaves the bin but by being taken out of it. */
export function Bin({ onBack }: { onBack: () => void }) {
  const { data: manuals, error, isPending, refetch } = useQuery(manualsInBin);
  if (isPending) return <Pending what="Looking into the bin …" lines={3} />;
  if (manuals === undefined)
    return <Failure what="The bin could not be opened" error={error} onRetry={() => void refetch()} />;
  if (manuals.length === 0) {
    return (
      <Empty title="The bin is empty" action={<Button onClick={onBack}>Back to the manuals</Button>}>
        Manuals that are put in the bin wait here until somebody takes them back.
      </Empty>
    );
  }
  return (
    <ManualsTable manuals={manuals} caption="Manuals in the bin" deedOf={(manual) => <TakeBack manual={manual} />} />
  );
}

function TakeBack({ manual }: { manual: Manual }) {
  const { mutate, isPending } = useMutation(restoreManual(useQueryClient()));
  return (
    <Button
      busy={isPending && 'Taking it back …'}
      aria-label={`Take back ${manual.title}`}
      onClick={() =>
        mutate(manual.id, {
          onSuccess: () => toast(`“${manual.title}” is in the library again.`),
          onError: (error) => toast.error(saidBy(error)),
        })
      }
    >
      Take it back
    </Button>
  );
}
