import { Link, useLocation } from 'react-router';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

export function Component() {
  const { pathname } = useLocation();
  useTitle('No such sheet');
  return (
    <Screen>
      <TitleBlock
        kind="Not in the drawer"
        title="There is no sheet at this address"
        cells={[
          { label: 'Address', value: <span className="break-all">{pathname}</span>, isFigure: true, stays: true },
        ]}
      />
      <p className="mt-4 max-w-[70ch]">
        The link may be old, or a letter of it may be wrong. A manual in the bin can be taken back by an archivist.
      </p>
      <div className="mt-4 flex flex-wrap gap-3">
        <Button look="main" asChild>
          <Link to="/">Go to the library</Link>
        </Button>
        <Button asChild>
          <Link to="/search">Search the manuals</Link>
        </Button>
      </div>
    </Screen>
  );
}
