import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { manualsInBin, manualsOnShelf } from '#src/api/manuals.ts';
import { useCan } from '#src/api/session.ts';
import { Bin } from '#src/features/library/bin.tsx';
import { AddManual } from '#src/features/library/manual-dialogs.tsx';
import { Shelf } from '#src/features/library/shelf.tsx';
import { DropSheet } from '#src/features/upload/drop-sheet.tsx';
import { GivenFiles } from '#src/features/upload/given-files.tsx';
import { useUploadLine } from '#src/features/upload/uploads.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

const nameOf = (file: File | undefined): string => (file?.name ?? '').replace(/\.[^.]+$/, '').replace(/[_-]+/g, ' ');

export function Component() {
  const [asked, setAsked] = useSearchParams();
  const filter = asked.get('filter') ?? '';
  const isBin = asked.get('view') === 'bin';
  const mayAdd = useCan('add-manuals');
  const adding = useAdding();
  useTitle(isBin ? 'Bin' : 'Library');
  const show = (next: Record<string, string>): void => setAsked(next, { replace: true });
  const addButton = mayAdd ? (
    <Button look="main" onClick={() => adding.open([])}>
      Add a manual
    </Button>
  ) : null;
  return (
    <Screen>
      <LibraryTitle isBin={isBin} />
      <div className="screen-only mt-4 mb-4 flex flex-wrap items-center gap-3">
        {isBin ? null : (
          <input
            type="search"
            aria-label="Show only manuals with these words in their record"
            placeholder="Show only …"
            value={filter}
            onChange={({ currentTarget }) => show(currentTarget.value === '' ? {} : { filter: currentTarget.value })}
            className={`${inputLook} flex-1 basis-48 sm:max-w-80`}
          />
        )}
        <div className="ml-auto flex flex-wrap items-center gap-3">
          {mayAdd ? (
            <Button look="quiet" onClick={() => show(isBin ? {} : { view: 'bin' })}>
              {isBin ? 'Back to the manuals' : 'Look in the bin'}
            </Button>
          ) : null}
          {isBin ? null : addButton}
        </div>
      </div>
      {isBin ? (
        <Bin onBack={() => show({})} />
      ) : (
        <Shelf filter={filter} onClearFilter={() => show({})} addButton={addButton} />
      )}
      {mayAdd && !isBin ? <Adding adding={adding} /> : null}
    </Screen>
  );
}

function LibraryTitle({ isBin }: { isBin: boolean }) {
  const { data: manuals = [] } = useQuery(isBin ? manualsInBin : manualsOnShelf);
  const sum = (count: (manual: (typeof manuals)[number]) => number): string =>
    manuals.reduce((total, manual) => total + count(manual), 0).toLocaleString('en');
  return (
    <TitleBlock
      kind={isBin ? 'Put aside' : 'All that is here'}
      title={isBin ? 'Bin' : 'Library'}
      cells={[
        { label: 'Manuals', value: String(manuals.length), isFigure: true, stays: true },
        { label: 'Pages', value: sum(({ pageCounts }) => pageCounts.all), isFigure: true, stays: true },
        { label: 'Doubts', value: sum(({ doubtCount }) => doubtCount), isFigure: true, stays: true },
        { label: 'Live values', value: sum(({ quantityCount }) => quantityCount), isFigure: true, stays: true },
      ]}
    />
  );
}

function useAdding() {
  const [isOpen, setOpen] = useState(false);
  const [title, setTitle] = useState('');
  const [files, setFiles] = useState<readonly File[]>([]);
  const open = (given: readonly File[]): void => {
    setFiles((before) => (isOpen ? [...before, ...given] : given));
    // Files that come while the form stands open must not clear what has been typed into it.
    if (!isOpen) setTitle(nameOf(given[0]));
    setOpen(true);
  };
  return { isOpen, setOpen, title, files, setFiles, open };
}

/** The manual is made first; its files then go on their own way while the new manual's screen shows how far they are. */
function Adding({
  adding: { isOpen, setOpen, title, files, setFiles, open },
}: {
  adding: ReturnType<typeof useAdding>;
}) {
  const line = useUploadLine();
  const navigate = useNavigate();
  return (
    <>
      <DropSheet says="Drop the scan here to make a new manual of it" onFiles={open} />
      <AddManual
        isOpen={isOpen}
        onOpenChange={setOpen}
        title={title}
        onAdded={({ id }) => {
          if (files.length > 0) line.add(id, files);
          setOpen(false);
          void navigate(`/manuals/${id}`);
        }}
      >
        <GivenFiles files={files} onChange={setFiles} />
      </AddManual>
    </>
  );
}
