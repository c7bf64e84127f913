import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo } from 'react';
import { Link } from 'react-router';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import { type LookupTable, describeKeys } from '#shared/calc/tables.ts';
import { counted } from '#shared/kit/counted.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import { channelTablesOfManual } from '#src/api/calculations.ts';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { SectionHead } from '#src/ui/screen.tsx';
import { ruleOfColumn } from './table-rule.ts';

/** The tables that formulas may look into: those tagged on the manual's own pages, and the published plans. */
export function ChannelTables({ manualId }: { manualId: string }) {
  const { data: own, error, refetch } = useQuery(channelTablesOfManual(manualId));
  if (own === undefined) {
    return error === null ? (
      <Pending what="Collecting the channel tables …" />
    ) : (
      <Failure what="The channel tables could not be collected" error={error} onRetry={() => void refetch()} />
    );
  }
  return (
    <>
      <section aria-label="Tables of this manual" className="mb-8">
        <SectionHead title="Of this manual" />
        {own.length === 0 ? (
          <p className="max-w-[70ch] text-pencil">
            None yet. Say on its page that a table is a channel table, and formulas can look into it.
          </p>
        ) : (
          own.map((table) => (
            <OneTable key={table.id} table={table}>
              <Link to={`/pages/${table.pageId}`} className="word-link">
                look at the page
              </Link>
              {table.left.length === 0 ? null : (
                <p className="text-doubt">
                  <span aria-hidden="true">? </span>
                  {`${counted(table.left.length, 'row')} left out: ${table.left.join('; ')}.`}
                </p>
              )}
            </OneTable>
          ))
        )}
      </section>
      <section aria-label="Published channel plans">
        <SectionHead title="Published plans" />
        {builtInTables.map((table) => (
          <OneTable key={table.id} table={table} />
        ))}
      </section>
    </>
  );
}

const rowsShown = 400;

function OneTable({ table, children }: { table: LookupTable; children?: ReactNode }) {
  const { id, title, source, key, columns, rows } = table;
  const head = [key, ...columns].map(({ name, unit }) => (
    <Th key={name}>
      {name}
      {unit === '' ? '' : ` (${unit})`}
    </Th>
  ));
  const first = columns[0]?.name ?? '';
  return (
    <article className="mb-4 border-t border-rule pt-3">
      <h3 className="font-semibold">{title}</h3>
      <p className="text-pencil">
        {`${source}. ${counted(rows.length, 'row')}: ${describeKeys(table)}.`} {children}
      </p>
      <p className="mt-1">
        <span className="text-pencil">In a formula: </span>
        <code className="figures break-words">{`lookup("${id}", channel, "${first}")`}</code>
      </p>
      <Rule table={table} />
      <details className="mt-2">
        <summary className="word-link">Its numbers</summary>
        <div className="mt-2 max-h-96 overflow-y-auto">
          <RuledTable caption={title} head={<>{head}</>}>
            {rows.slice(0, rowsShown).map((row) => (
              <tr key={row.join()}>
                {row.map((cell, at) => (
                  <Td key={columns[at - 1]?.name ?? 'key'} className="figures">
                    {cell}
                  </Td>
                ))}
              </tr>
            ))}
          </RuledTable>
        </div>
      </details>
    </article>
  );
}

/** How the channels of the first column of frequencies lie, and which rows do not fit: look for misprints there. */
function Rule({ table }: { table: LookupTable }) {
  const column = table.columns.findIndex(({ unit }) => unit !== '');
  const rule = useMemo(() => ruleOfColumn(table, column), [table, column]);
  if (rule === undefined) return null;
  const odd = rule.exceptions.slice(0, oddShown).map(({ channel, hz, rule: by }) => {
    const printed = formatQuantity(hz / hzPerMhz, 'MHz');
    return by === null
      ? `channel ${channel} at ${printed}`
      : `channel ${channel} at ${printed}, by the rule ${formatQuantity(by / hzPerMhz, 'MHz')}`;
  });
  return (
    <details className="mt-2">
      <summary className="word-link">The rule behind {table.columns[column]?.name}</summary>
      <p className="mt-1 max-w-[70ch]">{rule.says}</p>
      {odd.length === 0 ? null : (
        <p className="max-w-[70ch] text-pencil">
          {`Not by the rule: ${odd.join('; ')}${rule.exceptions.length > oddShown ? ' …' : ''}.`}
        </p>
      )}
      <p className="mt-1">
        <span className="text-pencil">As a formula: </span>
        <code className="figures break-words">{rule.expression}</code>
      </p>
    </details>
  );
}

const oddShown = 12;
const hzPerMhz = 1e6;
