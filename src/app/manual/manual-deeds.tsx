import { type ReactNode, useState } from 'react';
import { Link, useNavigate } from 'react-router';
import type { Manual } from '#shared/api/manuals.ts';
import { useCan } from '#src/api/session.ts';
import { BinManual, EditManual } from '#src/features/library/manual-dialogs.tsx';
import { HabitsDialog } from '#src/features/reading/habits-dialog.tsx';
import { Button } from '#src/ui/button.tsx';
import { toast } from '#src/ui/toast.ts';

/** What can be done with the manual as a whole. */
export function ManualDeeds({ manual, addScans }: { manual: Manual; addScans: ReactNode }) {
  const mayChange = useCan('add-manuals');
  const [open, setOpen] = useState<'edit' | 'habits' | 'bin' | null>(null);
  const navigate = useNavigate();
  const close = (): void => setOpen(null);
  return (
    <div className="screen-only mt-3 mb-6 flex flex-wrap items-center gap-x-5 gap-y-1">
      <Button look="quiet" asChild>
        <Link to={`/search?manualId=${manual.id}`}>Search in this manual</Link>
      </Button>
      <Button look="quiet" asChild>
        <Link to={`/manuals/${manual.id}/calculations`}>Calculations</Link>
      </Button>
      <Button look="quiet" asChild>
        <Link to={`/manuals/${manual.id}/editions`}>Editions</Link>
      </Button>
      {mayChange ? (
        <>
          <Button look="quiet" onClick={() => setOpen('edit')}>
            Correct the record
          </Button>
          <Button look="quiet" onClick={() => setOpen('habits')}>
            How it is read
          </Button>
          <Button look="quiet" onClick={() => setOpen('bin')}>
            Put in the bin
          </Button>
          <div className="ml-auto">{addScans}</div>
          <EditManual isOpen={open === 'edit'} onOpenChange={close} manual={manual} />
          <HabitsDialog isOpen={open === 'habits'} onOpenChange={close} manual={manual} />
          <BinManual
            isOpen={open === 'bin'}
            onOpenChange={close}
            manual={manual}
            onBinned={() => {
              close();
              toast(`“${manual.title}” is in the bin.`);
              void navigate('/');
            }}
          />
        </>
      ) : null}
    </div>
  );
}
