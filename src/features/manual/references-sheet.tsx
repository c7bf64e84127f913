import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { openReferencesIn } from '#src/api/references.ts';
import { useCan } from '#src/api/session.ts';
import { counted } from '#shared/kit/counted.ts';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';

/** What the manual's texts point at that it does not have: a misread number, or a page that is missing. */
export function ReferencesSheet({ manualId }: { manualId: string }) {
  const { data: open, error, isPending, refetch } = useQuery(openReferencesIn(manualId));
  const mayEdit = useCan('edit-pages');
  if (isPending) return <Pending what="Following the references …" />;
  if (open === undefined)
    return <Failure what="The references could not be followed" error={error} onRetry={() => void refetch()} />;
  if (open.length === 0) {
    return (
      <Empty title="Every reference leads somewhere">
        Texts such as “see paragraph 4-12” or “figure 5-3” are links on the pages that are read. Those that lead nowhere
        are listed here.
      </Empty>
    );
  }
  return (
    <>
      <p className="mb-3 max-w-[70ch] text-pencil">
        {`${counted(open.length, 'reference')} to something that is not in this manual: the number may be misread, here or at the place it names, or pages are missing.`}
      </p>
      <RuledTable
        caption="References that lead nowhere"
        head={
          <>
            <Th>Points at</Th>
            <Th>In the words</Th>
            <Th>On page</Th>
          </>
        }
      >
        {open.map(({ text, words, pageId, pageLabel, zone }, at) => (
          <tr key={at}>
            <Td className="font-semibold whitespace-nowrap">{text}</Td>
            <Td className="min-w-56">{`… ${words} …`}</Td>
            <Td className="figures whitespace-nowrap">
              <Link
                to={
                  mayEdit ? `/pages/${pageId}` : `/pages/${pageId}/read${zone === null ? '' : `?boxes=${zone.join()}`}`
                }
                className="word-link"
              >
                {pageLabel}
              </Link>
            </Td>
          </tr>
        ))}
      </RuledTable>
    </>
  );
}
