import { Outbox } from '#src/features/admin/outbox.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';
import { Allowed } from '#src/app/allowed.tsx';

export function Component() {
  useTitle('Outbox');
  return (
    <Allowed action="see-outbox">
      <Screen>
        <TitleBlock kind="Mails kept on this machine" title="Outbox" className="mb-6" />
        <Outbox />
      </Screen>
    </Allowed>
  );
}
