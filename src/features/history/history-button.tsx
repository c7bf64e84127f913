import { useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { HistoryPanel } from './history-panel.tsx';

type Props = { pageId: string; label: string; mayRestore: boolean; hasUnsaved?: boolean };

export function HistoryButton({ pageId, label, mayRestore, hasUnsaved = false }: Props) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={setOpen}
      width="wide"
      title={`History of page ${label}`}
      trigger={<Button>History</Button>}
    >
      <HistoryPanel pageId={pageId} mayRestore={mayRestore} hasUnsaved={hasUnsaved} />
    </Dialog>
  );
}
