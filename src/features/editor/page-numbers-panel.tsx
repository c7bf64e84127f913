import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Editor } from '@tiptap/core';
import { useEffect, useRef, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { counted } from '#shared/kit/counted.ts';
import { addQuantity } from '#src/api/quantities.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { toast } from '#src/ui/toast.ts';
import { type Decision, asNew, firstDecision, liveProposals } from './live-proposals.ts';
import { type PrintedNumber, type Showing, numbersOfPage, putLiveValues } from './printed-number.ts';
import { PageNumberRow } from './page-number-row.tsx';
import { inputFrom } from './quantity-from-print.ts';

type Props = { editor: Editor; page: Page; onClose: () => void };

/** All printed numbers of the page with what each is likely to be; those that are ticked become live at once. */
export function PageNumbersPanel({ editor, page, onClose }: Props) {
  const store = useLiveStore();
  const head = useRef<HTMLHeadingElement>(null);
  useEffect(() => head.current?.focus(), []);
  return (
    <section aria-label="Numbers of this page" className="margin-part">
      <h2 ref={head} tabIndex={-1} className="margin-head outline-none">
        Numbers of this page
      </h2>
      {store === null ? (
        <p className="text-pencil">Fetching the quantities of the manual …</p>
      ) : (
        <Proposals editor={editor} page={page} store={store} onClose={onClose} />
      )}
      <Button className="mt-2" look="quiet" onClick={onClose}>
        Put away
      </Button>
    </section>
  );
}

function Proposals({ editor, page, store, onClose }: Props & { store: LiveStore }) {
  // As the page stood when it was asked for: the list must not move under the hand.
  const [proposals] = useState(() => liveProposals(store, numbersOfPage(editor.state.doc)));
  const [decisions, setDecisions] = useState(() => proposals.map(firstDecision));
  const add = useMutation(addQuantity(useQueryClient(), page.manualId));
  const [isBusy, setBusy] = useState(false);
  const chosen = decisions.filter(({ isChosen }) => isChosen).length;
  if (proposals.length === 0)
    return <p className="text-pencil">Every number with a unit on this page is live already, or there is none.</p>;
  const make = async (): Promise<void> => {
    setBusy(true);
    try {
      const chosenOnes = proposals.flatMap(({ number }, index) => {
        const decision = decisions[index];
        return decision?.isChosen === true ? [{ number, ...decision }] : [];
      });
      const made = await quantitiesOf(chosenOnes, async ({ number, draft }) => {
        const { id } = await add.mutateAsync(inputFrom(draft, number, page.id));
        return id;
      });
      const put = showingsNow(editor, made);
      putLiveValues(editor, put);
      toast(`${counted(put.length, 'number')} made live.`);
      onClose();
    } catch (error) {
      toast.error(saidBy(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <>
      <p className="mb-2 text-pencil">
        Ticked are those that a quantity of the manual, or a formula over its quantities, gives to the printed digit.
      </p>
      <ol className="grid gap-2">
        {proposals.map((proposal, index) => {
          const decision = decisions[index];
          return decision === undefined ? null : (
            <PageNumberRow
              key={`${proposal.number.from} ${proposal.number.text}`}
              proposal={proposal}
              decision={decision}
              onDecide={(change) =>
                setDecisions((before) => before.map((each, at) => (at === index ? { ...each, ...change } : each)))
              }
            />
          );
        })}
      </ol>
      <Button
        className="mt-3"
        look="main"
        disabled={chosen === 0}
        busy={isBusy && 'Making them live …'}
        onClick={() => void make()}
      >
        {`Make ${counted(chosen, 'number')} live`}
      </Button>
    </>
  );
}

type Chosen = Decision & { number: PrintedNumber };

/** The quantity of each chosen number, the new ones added first, one after the other. */
async function quantitiesOf(chosen: readonly Chosen[], add: (each: Chosen) => Promise<string>): Promise<Showing[]> {
  const made: Showing[] = [];
  for (const each of chosen)
    made.push({ number: each.number, quantity: each.as === asNew ? await add(each) : each.as });
  return made;
}

/** The same numbers where they stand now; others may have written on the page meanwhile. One that is gone is left out. */
function showingsNow(editor: Editor, made: readonly Showing[]): Showing[] {
  const now: (PrintedNumber | null)[] = numbersOfPage(editor.state.doc);
  return made.flatMap(({ number, quantity }) => {
    const at = now.findIndex((each) => each?.text === number.text && each.before === number.before);
    const found = now[at];
    if (found === undefined || found === null) return [];
    now[at] = null;
    return [{ number: found, quantity }];
  });
}
