import { useEffect } from 'react';
import { useBlocker } from 'react-router';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';

type Props = { isDirty: boolean; onSave: () => Promise<boolean> };

/** Before unsaved text is left: save it, or leave it kept in this browser. */
export function LeaveDialog({ isDirty, onSave }: Props) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => isDirty && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isDirty) return;
    const warn = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isDirty]);
  if (blocker.state !== 'blocked') return null;
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : blocker.reset())}
      title="This page is not saved yet"
      intro="Leaving does not lose it: what you typed is kept in this browser and offered to you when you come back. Nobody else sees it until it is saved."
    >
      <Actions>
        <Button
          look="main"
          onClick={() => void onSave().then((isSaved) => (isSaved ? blocker.proceed() : blocker.reset()))}
        >
          Save and leave
        </Button>
        <Button onClick={() => blocker.proceed()}>Leave without saving</Button>
        <Button onClick={() => blocker.reset()}>Stay here</Button>
      </Actions>
    </Dialog>
  );
}
