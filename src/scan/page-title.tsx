import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link, useNavigate } from 'react-router';
import type { Page, PageState } from '#shared/api/pages.ts';
import { counted } from '#shared/kit/counted.ts';
import { oneManual } from '#src/api/manuals.ts';
import { pagesOfManual } from '#src/api/pages.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { useSettingWords } from '#src/blocks/live-value/setting-words.ts';
import { writtenDay } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { type Shape, StateWord, type Tone } from '#src/ui/state-word.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

const stateWords: Record<PageState, { word: string; tone: Tone; shape: Shape }> = {
  waiting: { word: 'waiting', tone: 'pencil', shape: 'ring' },
  reading: { word: 'being read', tone: 'signal', shape: 'half' },
  read: { word: 'read', tone: 'ink', shape: 'dot' },
  failed: { word: 'not read', tone: 'alarm', shape: 'cross' },
  corrected: { word: 'corrected', tone: 'good', shape: 'tick' },
  proofed: { word: 'proofed', tone: 'good', shape: 'double-tick' },
};

export type Turnable = { id: string; label: string };

type Props = {
  page: Page;
  doubts: number;
  /** The address of another page on the same kind of screen. */
  addressOf: (pageId: string) => string;
  /** Which state of the manual is shown. */
  edition?: ReactNode;
  /** The pages to turn to; those of the work where not given. */
  pages?: readonly Turnable[];
  /** What else can be done with the page. */
  children?: ReactNode;
};

/** The title block of a page, and the way to the pages before and after it. */
export function PageTitle({ page, doubts, addressOf, edition, pages, children }: Props) {
  const { data: manual } = useQuery(oneManual(page.manualId));
  const store = useLiveStore();
  const setting = useSettingWords(page.manualId);
  const { word, tone, shape } = stateWords[page.state];
  const { signOff } = page;
  return (
    <TitleBlock
      kind={manual === undefined ? 'Page' : [manual.maker, manual.documentNumber].filter(Boolean).join(', ') || 'Page'}
      title={
        <Link to={`/manuals/${page.manualId}`} className="hover:underline">
          {manual?.title ?? `Page ${page.label}`}
        </Link>
      }
      under={
        <div className="screen-only mt-2 flex flex-wrap items-center gap-x-3 gap-y-2 text-ink">
          <PageTurner page={page} pages={pages} addressOf={addressOf} />
          {children}
        </div>
      }
      cells={[
        { label: 'Document', value: manual?.documentNumber ?? 'no number', isFigure: true },
        ...(edition === undefined ? [] : [{ label: 'Edition', value: edition, stays: true }]),
        { label: 'Page', value: page.label, isFigure: true, stays: true },
        {
          label: 'State',
          value: (
            <StateWord tone={tone} shape={shape}>
              {word}
            </StateWord>
          ),
          stays: true,
        },
        ...(signOff === null ? [] : [{ label: 'Signed off', value: <Signature signOff={signOff} /> }]),
        { label: 'Revision', value: page.revision === 0 ? 'none yet' : String(page.revision), isFigure: true },
        { label: 'Doubts', value: <DoubtState doubts={doubts} />, stays: true },
        { label: 'Proof', value: <ProofState store={store} /> },
        { label: 'Setting', value: setting },
      ]}
    />
  );
}

function Signature({ signOff: { signedBy, signedAt, doubtCount } }: { signOff: NonNullable<Page['signOff']> }) {
  const doubts = doubtCount === 0 ? '' : `, with ${counted(doubtCount, 'doubt')}`;
  return `${signedBy}, ${writtenDay(signedAt)}${doubts}`;
}

function ProofState({ store }: { store: LiveStore | null }) {
  if (store === null || store.proof.items.length === 0) return 'nothing to prove';
  const disagreeing = store.proof.items.filter(({ agrees }) => !agrees).length;
  return disagreeing === 0 ? (
    <StateWord tone="good" shape="tick">
      holds
    </StateWord>
  ) : (
    <StateWord tone="alarm" shape="cross">
      {`${disagreeing} ${disagreeing === 1 ? 'disagrees' : 'disagree'}`}
    </StateWord>
  );
}

const DoubtState = ({ doubts }: { doubts: number }) =>
  doubts === 0 ? (
    <StateWord tone="good" shape="tick">
      none left
    </StateWord>
  ) : (
    <StateWord tone="doubt" shape="question">
      {doubts} left
    </StateWord>
  );

type TurnerProps = { page: Page; pages: readonly Turnable[] | undefined; addressOf: Props['addressOf'] };

function PageTurner({ page, pages: given, addressOf }: TurnerProps) {
  const { data: ofWork = [] } = useQuery({ ...pagesOfManual(page.manualId), enabled: given === undefined });
  const pages: readonly Turnable[] = given ?? ofWork;
  const navigate = useNavigate();
  const at = pages.findIndex(({ id }) => id === page.id);
  if (at < 0) return null;
  return (
    <nav aria-label="Pages of this manual" className="flex flex-wrap items-center gap-2">
      <Turn to={pages[at - 1]} addressOf={addressOf} label="Previous page" />
      <select
        aria-label="Go to page"
        className={`${inputLook} figures w-auto!`}
        value={page.id}
        onChange={({ currentTarget }) => void navigate(addressOf(currentTarget.value))}
      >
        {pages.map(({ id, label }) => (
          <option key={id} value={id}>
            {label}
          </option>
        ))}
      </select>
      <Turn to={pages[at + 1]} addressOf={addressOf} label="Next page" />
    </nav>
  );
}

function Turn({ to, addressOf, label }: { to: Turnable | undefined; addressOf: Props['addressOf']; label: string }) {
  if (to === undefined) return <Button disabled>{label}</Button>;
  return (
    <Button asChild>
      <Link to={addressOf(to.id)}>{label}</Link>
    </Button>
  );
}
