import { useQuery } from '@tanstack/react-query';
import { Link, useParams, useSearchParams } from 'react-router';
import { oneManual } from '#src/api/manuals.ts';
import { LiveValues } from '#src/blocks/live-value/live-values.tsx';
import { ChangeSheetView } from '#src/features/calculations/change-sheet.tsx';
import { ChannelTables } from '#src/features/calculations/channel-tables.tsx';
import { Crystals } from '#src/features/calculations/crystals.tsx';
import { Dependencies } from '#src/features/calculations/dependencies.tsx';
import { PlanView } from '#src/features/calculations/plan-view.tsx';
import { Proposals } from '#src/features/calculations/proposals.tsx';
import { ProofView } from '#src/features/calculations/proof-view.tsx';
import { ValuesSheet } from '#src/features/manual/values-sheet.tsx';
import { SettingBar } from '#src/features/reader/setting-bar.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { Tabs, TabSheet } from '#src/ui/tabs.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

const views = ['values', 'changes', 'plan', 'dependencies', 'proof', 'proposals', 'crystals', 'tables'] as const;
type View = (typeof views)[number];
const viewIn = (asked: string | null): View => views.find((view) => view === asked) ?? 'values';

/** The numbers of a manual and all that can be worked out with them. */
export function Component() {
  const { manualId = '' } = useParams();
  const { data: manual, error, refetch } = useQuery(oneManual(manualId));
  const [asked, setAsked] = useSearchParams();
  useTitle(manual === undefined ? undefined : `Calculations: ${manual.title}`);
  if (manual === undefined) {
    return (
      <Screen>
        {error === null ? (
          <Pending what="Taking the manual out …" />
        ) : (
          <Failure what="The manual could not be fetched" error={error} onRetry={() => void refetch()} />
        )}
      </Screen>
    );
  }
  return (
    <LiveValues manualId={manual.id}>
      <Screen>
        <TitleBlock
          kind="Calculations"
          title={
            <Link to={`/manuals/${manual.id}`} className="hover:underline">
              {manual.title}
            </Link>
          }
          under={[manual.maker, manual.documentNumber].filter(Boolean).join(', ') || undefined}
        />
        <div className="mb-4">
          <SettingBar manualId={manual.id} startsOpen={false} />
        </div>
        <Tabs
          label="Calculations"
          value={viewIn(asked.get('view'))}
          onValueChange={(view) => setAsked(view === 'values' ? {} : { view }, { replace: true })}
          tabs={[
            { value: 'values', label: 'Values' },
            { value: 'changes', label: 'Change sheet' },
            { value: 'plan', label: 'Frequency plan' },
            { value: 'dependencies', label: 'Dependencies' },
            { value: 'proof', label: 'Proof' },
            { value: 'proposals', label: 'Relations' },
            { value: 'crystals', label: 'Crystals' },
            { value: 'tables', label: 'Channel tables' },
          ]}
        >
          <TabSheet value="values">
            <ValuesSheet manualId={manual.id} />
          </TabSheet>
          <TabSheet value="changes">
            <ChangeSheetView manualId={manual.id} />
          </TabSheet>
          <TabSheet value="plan">
            <PlanView manualId={manual.id} />
          </TabSheet>
          <TabSheet value="dependencies">
            <Dependencies />
          </TabSheet>
          <TabSheet value="proof">
            <ProofView />
          </TabSheet>
          <TabSheet value="proposals">
            <Proposals manualId={manual.id} />
          </TabSheet>
          <TabSheet value="crystals">
            <Crystals />
          </TabSheet>
          <TabSheet value="tables">
            <ChannelTables manualId={manual.id} />
          </TabSheet>
        </Tabs>
      </Screen>
    </LiveValues>
  );
}
