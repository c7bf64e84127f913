import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { Edition } from '#shared/api/editions.ts';
import { Button } from '#src/ui/button.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { editionName } from './edition-words.ts';
import type { Shown } from './use-edition.ts';

type Props = {
  manualId: string;
  shown: Shown;
  /** The page is not in the edition, so the work is shown. */
  isMissing: boolean;
  bars: { areOn: boolean; turn: (areOn: boolean) => void; state: ReactNode };
};

/** Over the leaves: which state of the manual is read, and whether bars stand beside what changed. */
export function ReadingChoice({ manualId, shown, isMissing, bars }: Props) {
  const { edition, latest, before, mayChoose, choose } = shown;
  if (latest === null && edition === null) return null;
  return (
    <>
      {edition === null ? null : <Cautions {...{ manualId, edition, isMissing }} />}
      <div className="screen-only flex flex-wrap items-center gap-x-4 gap-y-2 py-2">
        {mayChoose && latest !== null ? (
          <ToggleGroup
            label="Which text"
            value={edition === null ? 'work' : 'edition'}
            onValueChange={choose}
            choices={[
              { value: 'edition', label: 'The edition' },
              { value: 'work', label: 'The work' },
            ]}
          />
        ) : null}
        {before === null ? null : (
          <>
            <Button onClick={() => bars.turn(!bars.areOn)}>
              {bars.areOn ? 'Hide change bars' : 'Show change bars'}
            </Button>
            <span role="status" className="text-pencil">
              {bars.areOn ? bars.state : ''}
            </span>
          </>
        )}
      </div>
    </>
  );
}

type CautionProps = { manualId: string; edition: Edition; isMissing: boolean };

function Cautions({ manualId, edition, isMissing }: CautionProps) {
  const { withdrawn } = edition;
  return (
    <>
      {withdrawn === null ? null : (
        <Notice
          kind="doubt"
          title={`${editionName(edition)} is withdrawn`}
          action={
            <Link className="word-link" to={`/manuals/${manualId}/editions`}>
              All editions
            </Link>
          }
        >
          {withdrawn.reason}
        </Notice>
      )}
      {isMissing ? (
        <Notice kind="doubt" title={`This page is not in ${editionName(edition)}`}>
          It was read later. What is shown is the work as it stands.
        </Notice>
      ) : null}
    </>
  );
}
