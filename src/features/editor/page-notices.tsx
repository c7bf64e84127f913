import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useEffectEvent, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { oneRevision } from '#src/api/revisions.ts';
import { canonical } from '#src/blocks/compare/canonical.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { toast } from '#src/ui/toast.ts';
import { type Draft, dropDraft, readDraft } from './draft.ts';
import type { Saving } from './use-saving.ts';

/** What a person has to know before going on: text left here before, a revision that came meanwhile, a save that failed. */
export function PageNotices({ page, saving }: { page: Page; saving: Saving }) {
  return (
    <div className="screen-only">
      {saving.fault === null ? null : (
        <Notice kind="alarm" title="Not saved">
          {saving.fault} Your text is kept in this browser.
        </Notice>
      )}
      <DraftNotice page={page} saving={saving} />
      <NewerNotice page={page} saving={saving} />
    </div>
  );
}

function DraftNotice({ page, saving }: { page: Page; saving: Saving }) {
  const client = useQueryClient();
  const [draft, setDraft] = useState<Draft | null>(() => {
    const kept = readDraft(page.id);
    return kept !== null && JSON.stringify(canonical(kept.document)) !== JSON.stringify(saving.base.document)
      ? kept
      : null;
  });
  if (draft === null) return null;
  const putBack = async (): Promise<void> => {
    try {
      // A draft on an older revision keeps that as its base, so that saving it is merged with what came since.
      if (draft.baseRevision !== saving.base.revision) {
        const { document } = await client.fetchQuery(oneRevision(page.id, draft.baseRevision));
        saving.setBase({ revision: draft.baseRevision, document: canonical(document) });
      }
      saving.show(draft.document);
      setDraft(null);
    } catch (error) {
      toast.error(saidBy(error));
    }
  };
  return (
    <Notice
      kind="doubt"
      title="You left text here that was not saved."
      action={
        <div className="flex flex-wrap gap-2">
          <Button look="main" onClick={() => void putBack()}>
            Put it back
          </Button>
          <Button
            onClick={() => {
              dropDraft(page.id);
              setDraft(null);
            }}
          >
            Throw it away
          </Button>
        </div>
      }
    >
      {`It was kept in this browser on ${writtenTime(draft.keptAt)}, on top of revision ${draft.baseRevision}.`}
    </Notice>
  );
}

/** A revision came while this page is open. Without own changes it is shown at once; own text is never touched. */
function NewerNotice({ page, saving }: { page: Page; saving: Saving }) {
  const { base, isDirty, isSaving } = saving;
  const [shownRevision, setShownRevision] = useState<number | null>(null);
  const isNewer = page.revision > base.revision && !isSaving;
  const takeOver = useEffectEvent(() => {
    const document = canonical(page.document);
    saving.setBase({ revision: page.revision, document });
    saving.show(document);
    setShownRevision(page.revision);
  });
  const takes = isNewer && !isDirty;
  useEffect(() => {
    // Not within this effect: the editor draws its live values at once, which React does not allow here.
    if (takes) queueMicrotask(takeOver);
  }, [takes]);
  if (isNewer && isDirty) {
    return (
      <Notice
        kind="doubt"
        isUrgent
        title={`Somebody saved revision ${page.revision} meanwhile.`}
        action={
          <Button
            onClick={() =>
              void saving.lookAtTheirs(page.revision).catch((error: unknown) => toast.error(saidBy(error)))
            }
          >
            Compare and merge
          </Button>
        }
      >
        Your text is kept. Nothing of it changes until you have looked at both.
      </Notice>
    );
  }
  if (shownRevision === null || shownRevision !== base.revision) return null;
  return (
    <Notice
      kind="info"
      isUrgent
      title={`Revision ${shownRevision} was saved by somebody else and is shown now.`}
      action={<Button onClick={() => setShownRevision(null)}>Understood</Button>}
    >
      You had changed nothing, so nothing had to be merged.
    </Notice>
  );
}
