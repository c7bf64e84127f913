import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router';
import type { z } from 'zod';
import type { partRow } from '#shared/api/parts.ts';
import { partsAsCsv, partsOfManual } from '#src/api/parts.ts';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { FigureCell, type Room, roomFor } from '#src/ui/figure-cell.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';

type Part = z.infer<typeof partRow>;

/** More rows than this at once make a table slow to draw. */
const rowsAtOnce = 300;
/** What a floating-point number may be off by is not shown: seven figures are more than any part has. */
const mostFigures = 7;

const magnitudeOf = ({ value }: Part): string =>
  value === null ? '' : String(Number(value.magnitude.toPrecision(mostFigures)));

function matching(parts: readonly Part[], filter: string): Part[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean);
  return parts.filter(({ refDes, partNumber, description, pageLabel }) => {
    const row = `${refDes} ${partNumber} ${description} ${pageLabel}`.toLowerCase();
    return words.every((word) => row.includes(word));
  });
}

/** Every row of every parts list of the manual, as one list to search and order from. */
export function PartsSheet({ manualId }: { manualId: string }) {
  const { data: parts, error, isPending, refetch } = useQuery(partsOfManual(manualId));
  if (isPending) return <Pending what="Collecting the parts …" />;
  if (parts === undefined)
    return <Failure what="The parts could not be collected" error={error} onRetry={() => void refetch()} />;
  if (parts.length === 0) {
    return (
      <Empty title="No parts list has been found">
        A table of a page becomes part of this list when it is tagged as a parts list, and it is said what each of its
        columns means. An editor does that beside the scan of the page.
      </Empty>
    );
  }
  return <Parts manualId={manualId} parts={parts} />;
}

function Parts({ manualId, parts }: { manualId: string; parts: readonly Part[] }) {
  const [filter, setFilter] = useState('');
  const [areOdd, setOdd] = useState(false);
  const [most, setMost] = useState(rowsAtOnce);
  const odd = parts.filter(({ problems }) => problems.length > 0);
  const found = matching(areOdd ? odd : parts, filter);
  const shown = found.slice(0, most);
  const room = roomFor(shown.map(magnitudeOf));
  return (
    <>
      <div className="screen-only mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <input
          type="search"
          aria-label="Show only parts with these words"
          placeholder="Show only …"
          value={filter}
          onChange={({ currentTarget }) => setFilter(currentTarget.value)}
          className={`${inputLook} flex-1 basis-48 sm:max-w-72`}
        />
        <p role="status" className="text-pencil">
          {filter === '' && !areOdd
            ? counted(parts.length, 'row')
            : `${found.length} of ${counted(parts.length, 'row')}`}
        </p>
        {odd.length === 0 ? null : (
          <Button aria-pressed={areOdd} onClick={() => setOdd(!areOdd)}>
            {areOdd ? 'Show all rows' : `Show ${counted(odd.length, 'row')} with a problem`}
          </Button>
        )}
        <Button asChild className="ml-auto">
          <a href={partsAsCsv(manualId)} download>
            Download as CSV
          </a>
        </Button>
      </div>
      {found.length === 0 ? (
        <Empty
          title={`No part has “${filter}”`}
          action={
            <Button
              onClick={() => {
                setFilter('');
                setOdd(false);
              }}
            >
              Show all parts
            </Button>
          }
        />
      ) : (
        <RuledTable caption="Parts" head={<PartsHead />}>
          {shown.map((part) => (
            <PartRow key={`${part.tableId} ${part.pageId} ${part.row}`} part={part} room={room} />
          ))}
        </RuledTable>
      )}
      {shown.length < found.length ? (
        <Button className="mt-4" onClick={() => setMost(most + rowsAtOnce)}>
          Show {Math.min(rowsAtOnce, found.length - shown.length)} more of {found.length}
        </Button>
      ) : null}
    </>
  );
}

const PartsHead = () => (
  <>
    <Th>Designator</Th>
    <Th>Part number</Th>
    <Th>Description</Th>
    <Th className="text-right">Quantity</Th>
    <Th>Value</Th>
    <Th>Page</Th>
  </>
);

function PartRow({ part, room }: { part: Part; room: Room }) {
  const { refDes, partNumber, description, quantity, value, sameAs, pageId, pageLabel, problems } = part;
  return (
    <tr>
      <Td className="figures max-w-48 min-w-24 font-semibold">{refDes}</Td>
      <Td className="figures whitespace-nowrap">{partNumber}</Td>
      <Td className="min-w-56">
        {description}
        {sameAs === null || value === null ? null : (
          <p className="text-small text-pencil">{`value and number of ${sameAs}`}</p>
        )}
        {problems.map((problem) => (
          <p key={problem} className="text-small text-doubt">
            <span aria-hidden="true">? </span>
            {problem}
          </p>
        ))}
      </Td>
      <Td className="figures text-right">{quantity}</Td>
      <Td className="whitespace-nowrap">
        {value === null ? null : (
          <>
            <FigureCell text={magnitudeOf(part)} unit={value.unit} room={room} />
            {value.tolerance === null ? null : <span className="figures text-pencil"> {value.tolerance}</span>}
          </>
        )}
      </Td>
      <Td className="figures whitespace-nowrap">
        <Link to={`/pages/${pageId}/read`} className="word-link">
          {pageLabel}
        </Link>
      </Td>
    </tr>
  );
}
