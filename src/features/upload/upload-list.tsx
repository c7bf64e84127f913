import { writtenBytes, writtenShare } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { type Shape, StateWord, type Tone } from '#src/ui/state-word.tsx';
import { isOpen, type Upload, type UploadState } from './upload-line.ts';

const looks: Record<UploadState, { word: string; tone: Tone; shape: Shape }> = {
  waiting: { word: 'waits its turn', tone: 'pencil', shape: 'ring' },
  sending: { word: 'being sent', tone: 'signal', shape: 'half' },
  examining: { word: 'sent, being examined', tone: 'signal', shape: 'half' },
  taken: { word: 'taken in', tone: 'good', shape: 'tick' },
  duplicate: { word: 'here already', tone: 'doubt', shape: 'question' },
  refused: { word: 'refused', tone: 'alarm', shape: 'cross' },
  failed: { word: 'not sent', tone: 'alarm', shape: 'cross' },
  stopped: { word: 'stopped by you', tone: 'pencil', shape: 'bars' },
};

type Props = {
  uploads: readonly Upload[];
  onStop: (id: number) => void;
  onTryAgain: (id: number) => void;
  onPutAway: () => void;
};

/** What becomes of each file that was given: each one answers for itself. */
export function UploadList({ uploads, onStop, onTryAgain, onPutAway }: Props) {
  if (uploads.length === 0) return null;
  const openCount = uploads.filter(isOpen).length;
  return (
    <section aria-label="Files being taken in" className="mb-6 border-y border-ink">
      <div className="flex flex-wrap items-center justify-between gap-x-4 py-1">
        <p role="status">{summaryOf(uploads, openCount)}</p>
        {openCount === 0 ? (
          <Button look="quiet" onClick={onPutAway}>
            Put this list away
          </Button>
        ) : null}
      </div>
      <ul className="divide-y divide-rule border-t border-rule">
        {uploads.map((upload) => (
          <UploadRow key={upload.id} upload={upload} onStop={onStop} onTryAgain={onTryAgain} />
        ))}
      </ul>
    </section>
  );
}

function summaryOf(uploads: readonly Upload[], openCount: number): string {
  const count = (state: UploadState): number => uploads.filter((upload) => upload.state === state).length;
  const taken = `${count('taken')} of ${uploads.length} taken in`;
  const refused = count('refused') + count('failed');
  return [
    openCount === 0 ? `Done: ${taken}` : `${taken}, ${openCount} to go`,
    refused === 0 ? '' : `${refused} not taken`,
  ]
    .filter(Boolean)
    .join('; ');
}

type RowProps = { upload: Upload } & Pick<Props, 'onStop' | 'onTryAgain'>;

function UploadRow({ upload, onStop, onTryAgain }: RowProps) {
  const { id, fileName, bytes, sentBytes, state, note } = upload;
  const { word, tone, shape } = looks[state];
  return (
    <li className="py-2">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <span className="min-w-0 flex-1 basis-48 break-all">{fileName}</span>
        <span className="figures text-small text-pencil">
          {state === 'sending' ? `${writtenShare(sentBytes, bytes)} of ${writtenBytes(bytes)}` : writtenBytes(bytes)}
        </span>
        <StateWord tone={tone} shape={shape} className="min-w-40">
          {word}
        </StateWord>
        {isOpen(upload) ? (
          <Button onClick={() => onStop(id)} aria-label={`Stop ${fileName}`}>
            Stop
          </Button>
        ) : null}
        {state === 'failed' || state === 'stopped' ? (
          <Button onClick={() => onTryAgain(id)} aria-label={`Send ${fileName} again`}>
            Send again
          </Button>
        ) : null}
      </div>
      {state === 'sending' || state === 'examining' ? (
        <Progress label={`${fileName} sent`} part={sentBytes} whole={bytes} className="mt-1" />
      ) : null}
      {note === undefined || note === '' ? null : <p className="mt-1 max-w-[80ch]">{note}</p>}
    </li>
  );
}
