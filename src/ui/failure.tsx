import { saidBy } from '#src/lib/said-by.ts';
import { Button } from './button.tsx';
import { Notice } from './notice.tsx';

type Props = { what: string; error: unknown; onRetry?: () => void };

/** What could not be done, why, and the way to try it again. */
export function Failure({ what, error, onRetry }: Props) {
  return (
    <Notice
      kind="alarm"
      title={what}
      action={onRetry === undefined ? undefined : <Button onClick={onRetry}>Try again</Button>}
    >
      {saidBy(error)}
    </Notice>
  );
}
