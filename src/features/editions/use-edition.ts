import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router';
import type { Edition } from '#shared/api/editions.ts';
import { editionsOfManual } from '#src/api/editions.ts';
import { useCan } from '#src/api/session.ts';
import { useStored } from '#src/lib/use-stored.ts';

const readings = ['work', 'edition'] as const;

export type Shown = {
  /** The edition that is read; null where it is the work. */
  edition: Edition | null;
  latest: Edition | null;
  /** The published one before what is read, to hold it against. */
  before: Edition | null;
  /** Editors choose; readers get the edition wherever there is one. */
  mayChoose: boolean;
  choose: (reading: (typeof readings)[number]) => void;
};

/**
 * Which state of a manual is read: the edition that the address asks for (`?edition=2`), else the newest one for readers,
 * and for editors what they last chose. Undefined until the editions are known.
 */
export function useEdition(manualId: string): { shown: Shown | undefined; error: unknown; retry: () => void } {
  const { data: editions, error, refetch } = useQuery(editionsOfManual(manualId));
  const [asked, setAsked] = useSearchParams();
  const mayChoose = useCan('edit-pages');
  const [chosen, setChosen] = useStored('benchleaf.reads', readings, 'work');
  const retry = (): void => void refetch();
  if (editions === undefined) return { shown: undefined, error, retry };
  const latest = editions.find(({ isLatest }) => isLatest) ?? null;
  const number = Number(asked.get('edition'));
  const named = editions.find((each) => each.number === number) ?? null;
  const edition = named ?? (mayChoose && chosen === 'work' ? null : latest);
  const standing = editions.filter(({ withdrawn }) => withdrawn === null);
  const before = edition === null ? latest : (standing.find((each) => each.number < edition.number) ?? null);
  const choose = (reading: (typeof readings)[number]): void => {
    setChosen(reading);
    setAsked((now) => {
      now.delete('edition');
      return now;
    });
  };
  return { shown: { edition, latest, before, mayChoose, choose }, error: null, retry };
}
