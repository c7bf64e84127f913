import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import type { Edition, EditionDifference } from '#shared/api/editions.ts';
import type { Quantity } from '#shared/api/quantities.ts';
import { counted } from '#shared/kit/counted.ts';
import { differenceOfEditions } from '#src/api/editions.ts';
import { Comparison } from '#src/blocks/compare/comparison.tsx';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Select } from '#src/ui/field.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { editionName } from './edition-words.ts';
import { changedFields, quantityLine } from './quantity-words.ts';

type Props = { manualId: string; editions: readonly Edition[] };
type Later = number | 'work';

/** What changed from one edition to a later one, or to the work as it stands. */
export function DifferenceView({ manualId, editions }: Props) {
  const newest = editions[0]?.number ?? 1;
  const [from, setFrom] = useState(newest);
  const [to, setTo] = useState<Later>('work');
  const laterOnes = editions.filter(({ number }) => number > from);
  const end: Later = to === 'work' || laterOnes.some(({ number }) => number === to) ? to : 'work';
  return (
    <section aria-label="What changed" className="mt-8">
      <h2 className="mb-3 font-serif text-title font-semibold">What changed</h2>
      <div className="screen-only grid gap-x-4 sm:grid-cols-2 sm:max-w-[40rem]">
        <Select label="From" value={from} onChange={({ currentTarget }) => setFrom(Number(currentTarget.value))}>
          {editions.map((edition) => (
            <option key={edition.id} value={edition.number}>
              {editionName(edition)}
            </option>
          ))}
        </Select>
        <Select
          label="To"
          value={end}
          onChange={({ currentTarget: { value } }) => setTo(value === 'work' ? 'work' : Number(value))}
        >
          <option value="work">The work as it stands</option>
          {laterOnes.map((edition) => (
            <option key={edition.id} value={edition.number}>
              {editionName(edition)}
            </option>
          ))}
        </Select>
      </div>
      <Difference key={`${from} ${end}`} manualId={manualId} from={from} to={end} />
    </section>
  );
}

function Difference({ manualId, from, to }: { manualId: string; from: number; to: Later }) {
  const { data, error, refetch } = useQuery(differenceOfEditions(manualId, from, to));
  if (data === undefined)
    return error === null ? (
      <Pending what="Holding one against the other …" lines={3} />
    ) : (
      <Failure what="They could not be compared" error={error} onRetry={() => void refetch()} />
    );
  const { pages, quantities, plan } = data;
  const count = [pages, quantities, plan].reduce(
    (sum, { added, removed, changed }) => sum + added.length + removed.length + changed.length,
    0,
  );
  if (count === 0) return <p className="text-pencil">Nothing: pages, quantities and frequency plan are the same.</p>;
  return (
    <div className="grid gap-6">
      <PagesPart pages={pages} />
      <QuantitiesPart quantities={quantities} />
      <PlanPart plan={plan} />
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title}>
      <h3 className="border-b border-ink pb-1 font-serif text-lead font-semibold">{title}</h3>
      <ul className="divide-y divide-rule">{children}</ul>
    </section>
  );
}

const Line = ({ children }: { children: ReactNode }) => <li className="py-2">{children}</li>;

function PagesPart({ pages: { added, removed, changed, same } }: { pages: EditionDifference['pages'] }) {
  return (
    <Part title="Pages">
      {changed.map((page) => (
        <Line key={page.pageId}>
          <ChangedPage page={page} />
        </Line>
      ))}
      {added.map(({ pageId, label }) => (
        <Line key={pageId}>{`Page ${label}: added`}</Line>
      ))}
      {removed.map(({ pageId, label }) => (
        <Line key={pageId}>{`Page ${label}: removed`}</Line>
      ))}
      {same === 0 ? null : (
        <Line>
          <span className="text-pencil">{`${counted(same, 'page')} unchanged`}</span>
        </Line>
      )}
    </Part>
  );
}

function ChangedPage({ page }: { page: EditionDifference['pages']['changed'][number] }) {
  const [isOpen, setOpen] = useState(false);
  const { pageId, label, from, to, change } = page;
  const what = change === 'words' ? 'changed' : 'same words, other form or marks';
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <span>{`Page ${label}: ${what}`}</span>
        {from === to ? null : (
          <Button
            look="quiet"
            aria-expanded={isOpen}
            aria-label={`What changed on page ${label}`}
            onClick={() => setOpen(!isOpen)}
          >
            {isOpen ? 'Fold' : 'Show what changed'}
          </Button>
        )}
      </div>
      {isOpen ? <Comparison pageId={pageId} older={from} newer={to} /> : null}
    </>
  );
}

function QuantitiesPart({ quantities: { added, removed, changed } }: { quantities: EditionDifference['quantities'] }) {
  if (added.length + removed.length + changed.length === 0) return null;
  return (
    <Part title="Quantities">
      {changed.map(({ before, after }) => (
        <Line key={after.id}>
          <QuantityName quantity={after} />: changed
          <ul className="pl-5">
            {changedFields(before, after).map(({ field, before: was, after: is }) => (
              <li key={field}>
                {`${field}: `}
                <span className="figures">{was}</span>
                {' → '}
                <span className="figures">{is}</span>
              </li>
            ))}
          </ul>
        </Line>
      ))}
      {[...added.map((each) => [each, 'added'] as const), ...removed.map((each) => [each, 'removed'] as const)].map(
        ([quantity, what]) => (
          <Line key={`${what} ${quantity.id}`}>
            <QuantityName quantity={quantity} />
            {`: ${what}, `}
            <span className="figures">{quantityLine(quantity)}</span>
          </Line>
        ),
      )}
    </Part>
  );
}

const QuantityName = ({ quantity: { label, symbol } }: { quantity: Quantity }) => (
  <>
    {label === '' ? null : `${label} `}
    <span className="figures text-pencil">{symbol}</span>
  </>
);

function PlanPart({ plan: { added, removed, changed } }: { plan: EditionDifference['plan'] }) {
  const stages = [
    ...changed.map((name) => `${name}: changed`),
    ...added.map((name) => `${name}: added`),
    ...removed.map((name) => `${name}: removed`),
  ];
  if (stages.length === 0) return null;
  return (
    <Part title="Frequency plan">
      {stages.map((line, at) => (
        <Line key={at}>{line}</Line>
      ))}
    </Part>
  );
}
