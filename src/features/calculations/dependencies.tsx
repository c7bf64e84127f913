import { useMemo, useState } from 'react';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { counted } from '#shared/kit/counted.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore, useValue } from '#src/blocks/live-value/live-values.tsx';
import { cx } from '#src/lib/class-names.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Select } from '#src/ui/field.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { kinOf, layoutOf } from './dependency-layout.ts';
import { Graph } from './graph.tsx';

/** Beyond so many the whole drawing is a thicket; then one value and its kin are shown. */
const mostAtOnce = 60;

/** What rests on what, drawn from what is set to what is worked out, with the values as they are now. */
export function Dependencies() {
  const store = useLiveStore();
  if (store === null) return <Pending what="Fetching the values …" />;
  if (store.quantities.length === 0)
    return <Empty title="Nothing rests on anything yet">Make a number of the manual live, or add a quantity.</Empty>;
  return <Drawing store={store} />;
}

function Drawing({ store }: { store: LiveStore }) {
  const { dependsOn } = store.program;
  // The stages of the frequency plan have a drawing of their own.
  const own = new Set(store.quantities.map(({ symbol }) => symbol));
  const order = store.program.order.filter((symbol) => own.has(symbol));
  const isMany = order.length > mostAtOnce;
  const [chosen, setChosen] = useState<string | null>(isMany ? (order.at(-1) ?? null) : null);
  const layout = useMemo(
    () => layoutOf(chosen === null ? order : kinOf(chosen, order, dependsOn), dependsOn),
    [order, dependsOn, chosen],
  );
  const bySymbol = new Map(store.program.cells.map(({ definition }) => [definition.symbol, definition]));
  return (
    <section aria-label="Dependencies">
      <div className="mb-3 flex flex-wrap items-end gap-x-4">
        <Select
          label="Show"
          frame="mb-0! flex-1 basis-56 sm:max-w-96"
          value={chosen ?? ''}
          onChange={({ currentTarget }) => setChosen(currentTarget.value === '' ? null : currentTarget.value)}
        >
          {isMany ? null : <option value="">all {counted(order.length, 'value')}</option>}
          {order.map((symbol) => (
            <option key={symbol} value={symbol}>
              {bySymbol.get(symbol)?.label || symbol} and its kin
            </option>
          ))}
        </Select>
        {chosen === null || isMany ? null : <Button onClick={() => setChosen(null)}>Show all</Button>}
      </div>
      <Graph label="Drawing of the dependencies" layout={layout} chosen={chosen}>
        {(symbol) => (
          <Node
            symbol={symbol}
            quantity={bySymbol.get(symbol)}
            isChosen={symbol === chosen}
            onChoose={() => setChosen(symbol)}
          />
        )}
      </Graph>
    </section>
  );
}

type NodeProps = { symbol: string; quantity: QuantityDefinition | undefined; isChosen: boolean; onChoose: () => void };

const kindWords = { input: 'input', constant: 'constant', derived: 'worked out' } as const;

function Node({ symbol, quantity, isChosen, onChoose }: NodeProps) {
  const kind = quantity?.kind ?? 'derived';
  return (
    <button
      type="button"
      aria-pressed={isChosen}
      title={quantity?.expression ?? kindWords[kind]}
      className={cx('graph-node', `is-${kind}`, isChosen && 'is-chosen')}
      onClick={onChoose}
    >
      <span className="block truncate">{quantity?.label || symbol}</span>
      <NodeValue symbol={symbol} />
      <span className="sr-only">{kindWords[kind]}</span>
    </button>
  );
}

function NodeValue({ symbol }: { symbol: string }) {
  const value = useValue(symbol);
  return value === undefined || value.problem !== undefined ? (
    <span className="figures block truncate text-alarm">unavailable</span>
  ) : (
    <span className="figures block truncate font-semibold">{value.text}</span>
  );
}
