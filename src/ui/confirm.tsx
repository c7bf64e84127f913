import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { Actions, Dialog } from './dialog.tsx';

type Props = {
  isOpen: boolean;
  onOpenChange: (isOpen: boolean) => void;
  title: string;
  intro: ReactNode;
  /** What the button says: the deed itself, never "OK". */
  deed: string;
  onConfirm: () => void;
  busy?: string | false;
  error?: ReactNode;
};

export function Confirm({ isOpen, onOpenChange, title, intro, deed, onConfirm, busy = false, error }: Props) {
  return (
    <Dialog isOpen={isOpen} onOpenChange={onOpenChange} title={title} intro={intro}>
      {error}
      <Actions>
        <Button look="danger" onClick={onConfirm} busy={busy}>
          {deed}
        </Button>
        <Button onClick={() => onOpenChange(false)}>Leave as it is</Button>
      </Actions>
    </Dialog>
  );
}
