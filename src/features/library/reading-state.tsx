import type { Manual } from '#shared/api/manuals.ts';
import { Progress } from '#src/ui/progress.tsx';
import { StateWord } from '#src/ui/state-word.tsx';

type Counted = Pick<Manual, 'pageCounts' | 'reading'>;

/** How far the reading of a manual has come, in words, and as a rule while it is under way. */
export function ReadingState({ manual }: { manual: Counted }) {
  const { all, waiting, reading, failed } = manual.pageCounts;
  const toGo = waiting + reading;
  return (
    <div className="grid gap-1">
      <ReadingWords manual={manual} />
      {toGo === 0 ? null : <Progress label="Pages read" part={all - toGo} whole={all} />}
      {failed === 0 ? null : (
        <StateWord tone="alarm" shape="cross">
          {failed} failed
        </StateWord>
      )}
    </div>
  );
}

function ReadingWords({ manual: { pageCounts, reading } }: { manual: Counted }) {
  const { all, waiting, reading: underWay, corrected, proofed } = pageCounts;
  const toGo = waiting + underWay;
  if (all === 0)
    return (
      <StateWord tone="pencil" shape="ring">
        no pages yet
      </StateWord>
    );
  if (toGo > 0 && reading === 'paused') {
    return <StateWord tone="doubt" shape="bars">{`paused at ${all - toGo} of ${all}`}</StateWord>;
  }
  if (toGo > 0) return <StateWord tone="signal" shape="half">{`${all - toGo} of ${all} read`}</StateWord>;
  if (proofed === all)
    return (
      <StateWord tone="good" shape="double-tick">
        all proofed
      </StateWord>
    );
  if (corrected + proofed === all)
    return (
      <StateWord tone="good" shape="tick">
        all corrected
      </StateWord>
    );
  const seen = corrected + proofed;
  return <StateWord shape="dot">{seen === 0 ? 'all read' : `all read, ${seen} corrected`}</StateWord>;
}
