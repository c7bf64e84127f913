import { isRouteErrorResponse, Link, useRouteError } from 'react-router';
import { saidBy } from '#src/lib/said-by.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

const notFetched =
  'It may have been replaced by a newer one while yours was open, or the connection is lost. Reload to fetch it again.';

const isNotFetched = (error: unknown): boolean =>
  error instanceof Error && /dynamically imported module|module script|preload/i.test(error.message);

function explained(error: unknown): string {
  if (isNotFetched(error)) return notFetched;
  if (isRouteErrorResponse(error)) return error.statusText;
  return saidBy(error);
}

/** Stands where a screen failed to draw. */
export function ScreenFault() {
  const error = useRouteError();
  return <Fault title="This screen could not be drawn" why={explained(error)} />;
}

/** Stands where the code of a screen could not be fetched. */
export const UnfetchedScreen = () => <Fault title="This screen could not be fetched" why={notFetched} />;

function Fault({ title, why }: { title: string; why: string }) {
  useTitle(title);
  return (
    <Screen>
      <TitleBlock kind="Fault" title={title} />
      <p className="mt-4 max-w-[70ch]">{why}</p>
      <p className="mt-1 max-w-[70ch] text-pencil">What was saved is safe in the server.</p>
      <div className="mt-4 flex flex-wrap gap-3">
        <Button look="main" onClick={() => window.location.reload()}>
          Reload this screen
        </Button>
        <Button asChild>
          <Link to="/" reloadDocument>
            Go to the library
          </Link>
        </Button>
      </div>
    </Screen>
  );
}
