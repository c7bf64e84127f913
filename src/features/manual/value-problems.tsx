import { useQuery } from '@tanstack/react-query';
import { valuesAt } from '#src/api/quantities.ts';
import { counted } from '#shared/kit/counted.ts';
import { Failure } from '#src/ui/failure.tsx';
import { Notice } from '#src/ui/notice.tsx';

/** What stands in the way of working the values out, at the home setting. */
export function ValueProblems({ manualId }: { manualId: string }) {
  const { data, error, refetch } = useQuery(valuesAt(manualId));
  if (data === undefined) {
    return error === null ? null : (
      <Failure what="The values could not be worked out" error={error} onRetry={() => void refetch()} />
    );
  }
  const ofValues = Object.values(data.values).flatMap(({ problem }) => (problem === undefined ? [] : [problem]));
  // A value that only waits for another one is told of at its own row.
  const roots = [...data.problems, ...ofValues].filter(({ cause, symbol }) => cause === undefined || cause === symbol);
  if (roots.length === 0) return null;
  return (
    <Notice kind="alarm" title={`${counted(ofValues.length, 'value')} cannot be worked out`} className="mb-4">
      <ul>
        {roots.map(({ symbol, code, message }) => (
          <li key={`${symbol} ${code} ${message}`}>
            <span className="figures font-semibold">{symbol}</span>: {message}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
