import { useInfiniteQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import type { auditEntry } from '#shared/api/audit.ts';
import { auditTrail } from '#src/api/audit.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';

type Entry = z.infer<typeof auditEntry>;

/** Who changed what. Entries are only ever added. */
export function AuditTrail() {
  const { data, error, isPending, refetch, hasNextPage, fetchNextPage, isFetchingNextPage } =
    useInfiniteQuery(auditTrail);
  if (isPending) return <Pending what="Fetching the trail …" />;
  if (data === undefined)
    return <Failure what="The trail could not be fetched" error={error} onRetry={() => void refetch()} />;
  const entries = data.pages.flatMap(({ items }) => items);
  if (entries.length === 0) {
    return (
      <Empty title="Nothing has been changed yet" action={<Button onClick={() => void refetch()}>Look again</Button>} />
    );
  }
  return (
    <>
      <RuledTable
        caption="Audit trail"
        head={
          <>
            <Th>When</Th>
            <Th>Who</Th>
            <Th>Did what</Th>
            <Th>To</Th>
            <Th>In detail</Th>
          </>
        }
      >
        {entries.map((entry) => (
          <EntryRow key={entry.id} entry={entry} />
        ))}
      </RuledTable>
      {hasNextPage ? (
        <Button className="mt-4" busy={isFetchingNextPage && 'Fetching …'} onClick={() => void fetchNextPage()}>
          Show older entries
        </Button>
      ) : null}
    </>
  );
}

const EntryRow = ({ entry: { at, who, did, to, details } }: { entry: Entry }) => (
  <tr>
    <Td className="whitespace-nowrap">
      <time dateTime={at}>{writtenTime(at)}</time>
    </Td>
    <Td className="whitespace-nowrap">{who}</Td>
    <Td className="whitespace-nowrap">{did}</Td>
    <Td className="max-w-72 min-w-32 font-semibold break-words">{to}</Td>
    <Td className="max-w-96 min-w-52">
      <Details details={details} />
    </Td>
  </tr>
);

const Details = ({ details }: { details: Entry['details'] }) => (
  <dl className="text-small">
    {flattened(details).map(([name, value]) => (
      <div key={name} className="flex gap-2">
        <dt className="text-pencil">{name}</dt>
        <dd className="figures min-w-0 [overflow-wrap:anywhere]">{value}</dd>
      </div>
    ))}
  </dl>
);

/** "pageCount" as "page count". */
const spaced = (name: string): string => name.replace(/([a-z])([A-Z0-9])/g, '$1 $2').toLowerCase();

/** Every fact on a line of its own, however deep it lay. What says nothing is left out, as are the names that only the machine uses. */
export function flattened(details: Readonly<Record<string, unknown>>, before = ''): [string, string][] {
  return Object.entries(details).flatMap(([key, value]): [string, string][] => {
    const name = before === '' ? spaced(key) : `${before}, ${spaced(key)}`;
    if (value === null || value === undefined || value === '' || /Id$/.test(key)) return [];
    if (typeof value !== 'object') return [[name, typeof value === 'string' ? value : JSON.stringify(value)]];
    if (Array.isArray(value)) return [[name, value.map(String).join(', ')]];
    return flattened(value as Record<string, unknown>, key === 'change' ? '' : name);
  });
}
