import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { z } from 'zod';
import type { evaluated, Quantity } from '#shared/api/quantities.ts';
import { proofOfManual, valuesAt } from '#src/api/quantities.ts';
import { Button } from '#src/ui/button.tsx';
import { FigureCell, type Room, roomFor } from '#src/ui/figure-cell.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';

type Deeds = { onEdit?: (quantity: Quantity) => void; onDelete?: (quantity: Quantity) => void };
type Proofed = { agrees: boolean; computed: string };
type Evaluated = z.infer<typeof evaluated>;
type Props = { manualId: string; quantities: readonly Quantity[] } & Deeds;

const kindWords: Record<Quantity['kind'], string> = { input: 'input', derived: 'worked out', constant: 'constant' };

export function QuantitiesTable({ manualId, quantities, onEdit, onDelete }: Props) {
  const { data: proof } = useQuery(proofOfManual(manualId));
  const { data: home } = useQuery(valuesAt(manualId));
  const proofs = new Map<string, Proofed>(proof?.items.map((item) => [item.quantityId, item]));
  const room = roomFor(quantities.map(({ printed }) => printed?.text ?? ''));
  return (
    <RuledTable
      caption="Quantities"
      head={
        <>
          <Th>Symbol</Th>
          <Th>Stands for</Th>
          <Th>Kind</Th>
          <Th>Home value or expression</Th>
          <Th>Unit</Th>
          <Th>As printed</Th>
          <Th>Proof</Th>
          {onEdit === undefined ? null : (
            <Th>
              <span className="sr-only">What to do</span>
            </Th>
          )}
        </>
      }
    >
      {quantities.map((quantity) => (
        <Row
          key={quantity.id}
          quantity={quantity}
          room={room}
          proofed={proofs.get(quantity.id)}
          atHome={home?.values[quantity.symbol]}
          onEdit={onEdit}
          onDelete={onDelete}
        />
      ))}
    </RuledTable>
  );
}

type RowProps = {
  quantity: Quantity;
  room: Room;
  proofed: Proofed | undefined;
  atHome: Evaluated | undefined;
  onEdit: Deeds['onEdit'] | undefined;
  onDelete: Deeds['onDelete'] | undefined;
};

function Row({ quantity, room, proofed, atHome, onEdit, onDelete }: RowProps) {
  const { symbol, label, kind, unit, expression, home, printed, pageId } = quantity;
  return (
    <tr>
      <Td className="figures font-semibold">{symbol}</Td>
      <Td className="min-w-44">{label}</Td>
      <Td className="whitespace-nowrap">{kindWords[kind]}</Td>
      <Td className="figures max-w-96 min-w-52 break-words">
        {expression ?? home ?? <span className="text-pencil">as printed</span>}
      </Td>
      <Td className="figures">{unit}</Td>
      <Td className="whitespace-nowrap">
        {printed === undefined ? (
          <span className="text-pencil">not printed</span>
        ) : (
          <Printed text={printed.text} room={room} pageId={pageId} />
        )}
      </Td>
      <Td className="min-w-28">
        <Proof proofed={proofed} atHome={atHome} />
      </Td>
      {onEdit === undefined ? null : (
        <Td className="whitespace-nowrap">
          <div className="-my-1 flex justify-end gap-4">
            <Button look="quiet" aria-label={`Edit ${symbol}`} onClick={() => onEdit(quantity)}>
              Edit
            </Button>
            <Button look="quiet" aria-label={`Delete ${symbol}`} onClick={() => onDelete?.(quantity)}>
              Delete
            </Button>
          </div>
        </Td>
      )}
    </tr>
  );
}

function Printed({ text, room, pageId }: { text: string; room: Room; pageId: string | null | undefined }) {
  const figure = <FigureCell text={text} room={room} />;
  return pageId === null || pageId === undefined ? (
    figure
  ) : (
    <Link
      to={`/pages/${pageId}/read`}
      className="decoration-signal underline-offset-3 hover:underline"
      aria-label={`${text}, on its page`}
    >
      {figure}
    </Link>
  );
}

/** No silent number: a value that cannot be worked out says why, whether or not there is one in print to compare with. */
function Proof({ proofed, atHome }: { proofed: Proofed | undefined; atHome: Evaluated | undefined }) {
  if (atHome?.problem !== undefined) {
    return (
      <div className="max-w-72">
        <StateWord tone="alarm" shape="cross">
          no value
        </StateWord>
        <span className="block text-small">{atHome.problem.message}</span>
      </div>
    );
  }
  if (proofed === undefined) {
    return (
      <span className="text-pencil">
        nothing to prove{atHome === undefined ? '' : '; is '}
        <span className="figures">{atHome?.text}</span>
      </span>
    );
  }
  if (proofed.agrees)
    return (
      <StateWord tone="good" shape="tick">
        agrees
      </StateWord>
    );
  return (
    <div>
      <StateWord tone="alarm" shape="cross">
        comes out as
      </StateWord>
      <span className="figures block">{proofed.computed === '' ? 'nothing' : proofed.computed}</span>
    </div>
  );
}
