import { People } from '#src/features/admin/people.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Screen } from '#src/ui/screen.tsx';
import { Allowed } from '#src/app/allowed.tsx';

export function Component() {
  useTitle('People');
  return (
    <Allowed action="manage-people">
      <Screen>
        <People />
      </Screen>
    </Allowed>
  );
}
