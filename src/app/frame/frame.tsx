import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Navigate, Outlet, ScrollRestoration, useLocation, useNavigate, useNavigation } from 'react-router';
import { whenSignedOut } from '#src/api/call.ts';
import { followEvents } from '#src/api/live.ts';
import { me, sessionKeys } from '#src/api/session.ts';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { SafetyLine } from './safety-line.tsx';
import { TopBar } from './top-bar.tsx';
import { useFocusOnArrival } from './use-focus-on-arrival.ts';

const signInAddress = (from: string): string =>
  from === '/' ? '/sign-in' : `/sign-in?back=${encodeURIComponent(from)}`;

/** What all screens of a person who is signed in have in common. */
export function Frame() {
  const { data: person, error, isPending, refetch } = useQuery(me);
  const { pathname, search } = useLocation();
  const signInFrom = signInAddress(pathname + search);
  useSignedOut(signInFrom);
  if (isPending) {
    return (
      <Screen>
        <Pending what="Opening …" />
      </Screen>
    );
  }
  if (error !== null && person === undefined) {
    return (
      <Screen>
        <Failure what="The library could not be opened" error={error} onRetry={() => void refetch()} />
      </Screen>
    );
  }
  if (person === null || person === undefined) return <Navigate to={signInFrom} replace />;
  return <SignedIn />;
}

function SignedIn() {
  const client = useQueryClient();
  const { state } = useNavigation();
  const main = useFocusOnArrival();
  useEffect(() => followEvents(client), [client]);
  return (
    <>
      <a href="#main" className="sr-only z-50 bg-leaf px-3 py-2 focus:not-sr-only focus:fixed focus:top-2 focus:left-2">
        Go to the content
      </a>
      <TopBar />
      <div role="status" className="screen-only h-px">
        {state === 'loading' ? (
          <>
            <div className="pending-rule bg-signal" />
            <span className="sr-only">Opening …</span>
          </>
        ) : null}
      </div>
      <main id="main" ref={main} tabIndex={-1} className="flex min-w-0 flex-1 flex-col outline-none">
        <Outlet />
      </main>
      <SafetyLine />
      <ScrollRestoration />
    </>
  );
}

/** A session may end while a screen is open: then sign in, and come back to it. */
function useSignedOut(signInFrom: string): void {
  const client = useQueryClient();
  const navigate = useNavigate();
  useEffect(
    () =>
      whenSignedOut(() => {
        client.setQueryData(sessionKeys.me, null);
        void navigate(signInFrom, { replace: true });
      }),
    [client, navigate, signInFrom],
  );
}
