import { writtenBytes } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { PickFiles, takenInWords } from './pick-files.tsx';

type Props = { files: readonly File[]; onChange: (files: readonly File[]) => void };

/** Files chosen before there is a manual to send them to. */
export function GivenFiles({ files, onChange }: Props) {
  return (
    <fieldset className="border border-dashed border-edge px-3 pt-1 pb-3">
      <legend className="px-1 font-semibold">Scans</legend>
      {files.length === 0 ? (
        <p className="mb-2 text-pencil">
          Drop files here, or choose them: {takenInWords}. They can also be added later.
        </p>
      ) : null}
      <ul className="mb-2 divide-y divide-rule">
        {files.map((file, at) => (
          <li key={`${file.name} ${file.size} ${file.lastModified}`} className="flex items-center gap-3 py-1">
            <span className="min-w-0 flex-1 break-all">{file.name}</span>
            <span className="figures text-small text-pencil">{writtenBytes(file.size)}</span>
            <Button
              look="quiet"
              aria-label={`Leave out ${file.name}`}
              onClick={() => onChange(files.filter((_each, index) => index !== at))}
            >
              Leave out
            </Button>
          </li>
        ))}
      </ul>
      <PickFiles onFiles={(more) => onChange([...files, ...more])}>
        {files.length === 0 ? 'Choose files' : 'Choose more files'}
      </PickFiles>
    </fieldset>
  );
}
