import { cx } from '#src/lib/class-names.ts';
import { FigureCell } from '#src/ui/figure-cell.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import type { Summary } from './setting-summary.ts';

/** Figures on each side of the point in a column of texts, so that all points stand in one line. */
function roomFor(texts: readonly string[]): { left: number; right: number } {
  const sides = texts.map((text) => /^([-+−±]?[\d,]*)(?:\.(\d*))?/.exec(text.trim()) ?? []);
  return {
    left: Math.max(1, ...sides.map(([, whole = '']) => whole.length)),
    right: Math.max(0, ...sides.map(([, , fraction = '']) => fraction.length)),
  };
}

export function SummaryTable({ summary: { rows } }: { summary: Summary }) {
  if (rows.length === 0) return <p className="text-pencil">No value of this manual is worked out from others yet.</p>;
  const printedRoom = roomFor(rows.map(({ placed }) => placed.printed));
  const setRoom = roomFor(rows.map(({ placed }) => placed.asSet));
  const head = (
    <>
      <Th>Value</Th>
      <Th>As printed</Th>
      <Th>As set</Th>
      <Th>State</Th>
    </>
  );
  return (
    <RuledTable caption="Values at this setting" head={head}>
      {rows.map(({ quantity, placed, missing }) => (
        <tr key={quantity.id}>
          <Td className="min-w-44">{quantity.label}</Td>
          <Td className="whitespace-nowrap text-pencil">
            <FigureCell text={placed.printed} {...printedRoom} />
          </Td>
          <Td
            className={missing === undefined ? cx('whitespace-nowrap', placed.isMoved && 'text-signal') : 'text-pencil'}
          >
            {missing === undefined ? <FigureCell text={placed.asSet} {...setRoom} /> : missing}
          </Td>
          <Td>
            <RowState placed={placed} />
          </Td>
        </tr>
      ))}
    </RuledTable>
  );
}

function RowState({ placed: { missing, isOutsideLimits, isMoved } }: { placed: Summary['rows'][number]['placed'] }) {
  if (missing !== undefined)
    return (
      <StateWord tone="alarm" shape="cross">
        unavailable
      </StateWord>
    );
  if (isOutsideLimits)
    return (
      <StateWord tone="alarm" shape="cross">
        outside limits
      </StateWord>
    );
  return isMoved ? (
    <StateWord tone="signal" shape="dot">
      moved
    </StateWord>
  ) : (
    <StateWord tone="pencil" shape="ring">
      as printed
    </StateWord>
  );
}
