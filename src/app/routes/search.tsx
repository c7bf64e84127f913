import { useSearchParams } from 'react-router';
import type { Wanted } from '#src/api/search.ts';
import { Results } from '#src/features/search/results.tsx';
import { changed, SearchForm } from '#src/features/search/search-form.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

const examples = ['455 kc', 'crystal', 'limiter grid', '0.01 mfd'];

export function Component() {
  const [asked, setAsked] = useSearchParams();
  const wanted = changed(
    { q: asked.get('q') ?? '' },
    { manualId: asked.get('manualId') ?? '', kind: asked.get('kind') ?? '' },
  );
  useTitle(wanted.q === '' ? 'Search' : `“${wanted.q}”`);
  const ask = ({ q, manualId, kind }: Wanted): void =>
    setAsked({
      ...(q === '' ? {} : { q }),
      ...(manualId === undefined ? {} : { manualId }),
      ...(kind === undefined ? {} : { kind }),
    });
  const isNarrowed = wanted.manualId !== undefined || wanted.kind !== undefined;
  return (
    <Screen>
      <TitleBlock kind="Search" title={wanted.q === '' ? 'What do you look for?' : `“${wanted.q}”`} />
      <SearchForm key={wanted.q} wanted={wanted} onWanted={ask} />
      {wanted.q === '' ? (
        <Empty
          title="For instance"
          action={examples.map((q) => (
            <Button key={q} onClick={() => ask({ ...wanted, q })}>
              {q}
            </Button>
          ))}
        >
          Words, part numbers, reference designators and quantities are found in every manual, each with its place on
          the scan.
        </Empty>
      ) : (
        <Results wanted={wanted} onWiden={isNarrowed ? () => ask({ q: wanted.q }) : undefined} />
      )}
    </Screen>
  );
}
