import { Dialog } from '#src/ui/dialog.tsx';
import { deedKeys, otherKeys } from './keys.ts';

export function KeysDialog({ isOpen, onOpenChange }: { isOpen: boolean; onOpenChange: (isOpen: boolean) => void }) {
  return (
    <Dialog isOpen={isOpen} onOpenChange={onOpenChange} title="Keys">
      <dl className="divide-y divide-rule">
        {[...deedKeys, ...otherKeys].map(({ shown, says }) => (
          <div key={shown} className="flex gap-4 py-1">
            <dt className="w-48 shrink-0 font-semibold">
              <kbd className="font-sans">{shown}</kbd>
            </dt>
            <dd>{says}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}
