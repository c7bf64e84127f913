import { AuditTrail } from '#src/features/admin/audit-trail.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';
import { Allowed } from '#src/app/allowed.tsx';

export function Component() {
  useTitle('Audit trail');
  return (
    <Allowed action="see-audit">
      <Screen>
        <TitleBlock kind="Who changed what, newest first" title="Audit trail" className="mb-6" />
        <AuditTrail />
      </Screen>
    </Allowed>
  );
}
