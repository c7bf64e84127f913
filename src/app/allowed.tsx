import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { type Action, lowestRole } from '#shared/access/roles.ts';
import { me, useCan } from '#src/api/session.ts';
import { Button } from '#src/ui/button.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

/** A screen for those who may; others are told who may, instead of being refused by each of its parts. */
export function Allowed({ action, children }: { action: Action; children: ReactNode }) {
  const { data: person } = useQuery(me);
  if (useCan(action)) return children;
  return (
    <Screen>
      <TitleBlock
        kind="Not open to you"
        title="This screen is for another role"
        cells={[
          { label: 'Needs', value: lowestRole[action], stays: true },
          { label: 'You are', value: person?.role ?? '', stays: true },
        ]}
      />
      <p className="mt-4">An administrator can give you another role.</p>
      <Button look="main" className="mt-4" asChild>
        <Link to="/">Go to the library</Link>
      </Button>
    </Screen>
  );
}
