import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Manual } from '#shared/api/manuals.ts';
import { type Steering, steerReading } from '#src/api/manuals.ts';
import { useCan } from '#src/api/session.ts';
import { counted } from '#shared/kit/counted.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { toast } from '#src/ui/toast.ts';

const done: Record<Steering, string> = {
  pause: 'Reading is paused. Pages under way are still finished.',
  resume: 'Reading goes on.',
  cancel: 'Reading is cancelled. Pages that were waiting can be read later.',
  retry: 'The failed pages are in the queue again.',
};

/** What is done, what is left, and how to stop it; nothing once every page is read. */
export function ReadingControls({ manual }: { manual: Manual }) {
  const maySteer = useCan('run-recognition');
  const { mutate, isPending } = useMutation(steerReading(useQueryClient(), manual.id));
  const { all, waiting, reading, failed } = manual.pageCounts;
  const toGo = waiting + reading;
  if (toGo === 0 && failed === 0) return null;
  const isPaused = manual.reading === 'paused';
  const steer = (what: Steering): void =>
    mutate(what, { onSuccess: () => toast(done[what]), onError: (error) => toast.error(saidBy(error)) });
  return (
    <section aria-label="Reading" className="screen-only mb-6 border-t border-rule pt-2">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <p role="status" className="flex-1 basis-60">
          {progressWords(manual)}
        </p>
        {maySteer && toGo > 0 ? (
          <>
            <Button disabled={isPending} onClick={() => steer(isPaused ? 'resume' : 'pause')}>
              {isPaused ? 'Resume reading' : 'Pause reading'}
            </Button>
            <Button disabled={isPending} onClick={() => steer('cancel')}>
              Cancel what is left
            </Button>
          </>
        ) : null}
        {maySteer && failed > 0 ? (
          <Button disabled={isPending} onClick={() => steer('retry')}>
            {failed === 1 ? 'Try the failed page again' : `Try ${failed} failed pages again`}
          </Button>
        ) : null}
      </div>
      {toGo === 0 ? null : <Progress label="Pages read" part={all - toGo} whole={all} className="mt-2" />}
    </section>
  );
}

function progressWords({ pageCounts, reading }: Manual): string {
  const { all, waiting, reading: underWay, failed } = pageCounts;
  const toGo = waiting + underWay;
  const failures = failed === 0 ? '' : ` ${counted(failed, 'page')} failed.`;
  if (toGo === 0) return failures.trim();
  const state = reading === 'paused' ? 'Paused' : 'Reading';
  return `${state}: ${all - toGo} of ${all} pages done, ${toGo} to go.${failures}`;
}
