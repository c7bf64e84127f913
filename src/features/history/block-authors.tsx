import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { authorsOfPage } from '#src/api/revisions.ts';
import { wordForKind } from '#src/blocks/compare/compared-text.tsx';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';

/** Enough of a block's words to know it by. */
const mostLetters = 90;
const beginning = (words: string): string =>
  words.length > mostLetters ? `${words.slice(0, mostLetters).trimEnd()} …` : words;

/** Who wrote each block of the page as it stands; looked up when somebody asks. */
export function BlockAuthors({ pageId }: { pageId: string }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <section aria-label="Who wrote what" className="mt-6 border-t border-ink pt-3">
      <Button aria-expanded={isOpen} onClick={() => setOpen(!isOpen)}>
        {isOpen ? 'Fold who wrote what' : 'Who wrote what'}
      </Button>
      {isOpen ? <Authors pageId={pageId} /> : null}
    </section>
  );
}

function Authors({ pageId }: { pageId: string }) {
  const { data, error, refetch } = useQuery(authorsOfPage(pageId));
  if (data === undefined)
    return error === null ? (
      <Pending what="Going through the revisions …" lines={3} />
    ) : (
      <Failure what="Who wrote what could not be found out" error={error} onRetry={() => void refetch()} />
    );
  if (data.length === 0) return <p className="mt-2 text-pencil">The page has no text yet.</p>;
  const head = (
    <>
      <Th>Block</Th>
      <Th>By</Th>
      <Th>Revision</Th>
      <Th>Saved</Th>
    </>
  );
  return (
    <div className="mt-3">
      <RuledTable caption="Who wrote each block" head={head}>
        {data.map(({ block, kind, words, revision: { number, origin, author, savedAt } }) => (
          <tr key={block}>
            <Td className="min-w-52">
              <span className="cell-label block">{wordForKind(kind)}</span>
              <span className="font-serif">{beginning(words)}</span>
            </Td>
            <Td>{origin === 'machine' ? 'Recognition' : author}</Td>
            <Td className="figures">{number}</Td>
            <Td className="whitespace-nowrap">{writtenTime(savedAt)}</Td>
          </tr>
        ))}
      </RuledTable>
    </div>
  );
}
