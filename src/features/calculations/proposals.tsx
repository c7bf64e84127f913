import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router';
import type { RelationProposal } from '#shared/api/calculations.ts';
import { counted } from '#shared/kit/counted.ts';
import { judgeRelation, relationsOf } from '#src/api/calculations.ts';
import { addQuantity } from '#src/api/quantities.ts';
import { useCan } from '#src/api/session.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Field } from '#src/ui/field.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { toast } from '#src/ui/toast.ts';
import { type Naming, namingsFor, quantitiesFor, withSymbols } from './accept-relation.ts';

/** Relations that the printed numbers suggest. The machine proposes; an editor takes one or dismisses it. */
export function Proposals({ manualId }: { manualId: string }) {
  const store = useLiveStore();
  const mayJudge = useCan('edit-quantities');
  const { data: found, error, isFetching, refetch } = useQuery(relationsOf(manualId));
  if (!mayJudge)
    return <Empty title="Relations are looked for by editors">What they accept becomes values of this manual.</Empty>;
  if (store === null || isFetching) return <Pending what="Looking through the printed numbers …" />;
  const look = (words: string) => (
    <Button look={found === undefined ? 'main' : 'plain'} onClick={() => void refetch()}>
      {words}
    </Button>
  );
  if (found === undefined) {
    return (
      <>
        {error === null ? null : <Failure what="The relations could not be looked for" error={error} />}
        <Empty title="What do the printed numbers have to do with one another?" action={look('Look for relations')}>
          Sums, differences, multiples and columns that follow from others are proposed where they hold to the printed
          digits and chance does not explain them. Nothing is changed until you accept one.
        </Empty>
      </>
    );
  }
  return (
    <section aria-label="Proposed relations">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <p role="status">
          {`${counted(found.items.length, 'relation')} proposed among ${counted(found.numbers, 'printed number')}`}
        </p>
        {look('Look again')}
      </div>
      <ol className="grid gap-3">
        {found.items.map((proposal) => (
          <li key={proposal.filled} className="border border-rule bg-leaf p-3">
            <Proposal store={store} proposal={proposal} />
          </li>
        ))}
      </ol>
    </section>
  );
}

function Proposal({ store, proposal }: { store: LiveStore; proposal: RelationProposal }) {
  const judge = useMutation(judgeRelation(useQueryClient(), store.manualId));
  const [isTaking, setTaking] = useState(false);
  const { filled, says, table, numbers } = proposal;
  const say = (verdict: 'accepted' | 'dismissed'): void =>
    judge.mutate({ relation: filled, verdict }, { onError: (error) => toast.error(saidBy(error)) });
  const pages = new Map(numbers.map(({ pageId, pageLabel }) => [pageId, pageLabel]));
  return (
    <>
      <p className="figures font-semibold break-words">{filled}</p>
      <p>{says}</p>
      {table === null || table.failing.length === 0 ? null : (
        <p className="text-doubt">
          <span aria-hidden="true">? </span>
          {`It fails in row ${table.failing.join(', ')}: look there for a misprint or a misreading.`}
        </p>
      )}
      <p className="text-small text-pencil">
        {pages.size === 1 ? 'Page ' : 'Pages '}
        {[...pages].map(([pageId, label], at) => (
          <span key={pageId}>
            {at === 0 ? '' : ', '}
            <Link to={`/pages/${pageId}/read`} className="word-link figures">
              {label}
            </Link>
          </span>
        ))}
      </p>
      {isTaking ? (
        <Taking store={store} proposal={proposal} onTaken={() => say('accepted')} onLeave={() => setTaking(false)} />
      ) : (
        <div className="mt-2 flex flex-wrap gap-2">
          {table === null ? <Button onClick={() => setTaking(true)}>Accept</Button> : null}
          <Button look="quiet" busy={judge.isPending && 'Saying so …'} onClick={() => say('dismissed')}>
            Dismiss
          </Button>
        </div>
      )}
    </>
  );
}

type TakingProps = { store: LiveStore; proposal: RelationProposal; onTaken: () => void; onLeave: () => void };

/** Names for the numbers that are no quantities yet, to be confirmed; then they are added. */
function Taking({ store, proposal, onTaken, onLeave }: TakingProps) {
  const add = useMutation(addQuantity(useQueryClient(), store.manualId));
  const taken = store.program.cells.map(({ definition }) => definition.symbol);
  const [namings, setNamings] = useState(() => namingsFor(proposal, taken));
  const [fault, setFault] = useState<string | null>(null);
  const news = namings.filter(({ isNew }) => isNew);
  const accept = async (): Promise<void> => {
    setFault(null);
    try {
      for (const quantity of quantitiesFor(proposal, namings)) await add.mutateAsync(quantity);
      toast(news.length === 0 ? 'Accepted.' : `${counted(news.length, 'quantity', 'quantities')} added.`);
      onTaken();
    } catch (error) {
      setFault(saidBy(error));
    }
  };
  const rename = (id: string, part: Partial<Naming>): void =>
    setNamings(namings.map((each) => (each.id === id ? { ...each, ...part } : each)));
  return (
    <div className="mt-3 border-t border-rule pt-3">
      <p className="mb-2">
        <span className="text-pencil">Will be </span>
        <code className="figures">
          {`${symbolOf(namings, proposal.target)} = ${withSymbols(proposal.expression, new Map(namings.map(({ id, symbol }) => [id, symbol])))}`}
        </code>
      </p>
      {news.map(({ id, text, symbol, label }) => (
        <div key={id} className="grid gap-x-4 sm:grid-cols-[10rem_1fr_1fr]">
          <p className="figures self-center">{text}</p>
          <Field
            label="Symbol"
            className="figures"
            value={symbol}
            onChange={({ currentTarget }) => rename(id, { symbol: currentTarget.value })}
          />
          <Field
            label="Label"
            value={label}
            onChange={({ currentTarget }) => rename(id, { label: currentTarget.value })}
          />
        </div>
      ))}
      {fault === null ? null : (
        <p role="alert" className="mb-2 text-alarm">
          {fault}
        </p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button look="main" busy={add.isPending && 'Adding …'} onClick={() => void accept()}>
          {news.length === 0 ? 'Accept it' : `Add ${counted(news.length, 'quantity', 'quantities')}`}
        </Button>
        <Button onClick={onLeave}>Leave</Button>
      </div>
    </div>
  );
}

const symbolOf = (namings: readonly Naming[], target: string): string =>
  namings.find(({ id }) => id === target)?.symbol ?? target;
