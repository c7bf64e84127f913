import { useMemo, useState } from 'react';
import type { Quantity } from '#shared/api/quantities.ts';
import { counted } from '#shared/kit/counted.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore, useValue } from '#src/blocks/live-value/live-values.tsx';
import { cx } from '#src/lib/class-names.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Select } from '#src/ui/field.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { type Layout, kinOf, layoutOf } from './dependency-layout.ts';
import './calculations.css';

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
  const { order, dependsOn } = store.program;
  const isMany = order.length > mostAtOnce;
  const [chosen, setChosen] = useState<string | null>(isMany ? (order.at(-1) ?? null) : null);
  const layout = useMemo(
    () => layoutOf(chosen === null ? order : kinOf(chosen, order, dependsOn), dependsOn),
    [order, dependsOn, chosen],
  );
  const bySymbol = new Map(store.quantities.map((each) => [each.symbol, each]));
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
      <Graph layout={layout} bySymbol={bySymbol} chosen={chosen} onChoose={setChosen} />
    </section>
  );
}

const box = { width: 190, height: 58, across: 64, down: 18 };
const leftOf = (layer: number): number => layer * (box.width + box.across);
const topOf = (row: number): number => row * (box.height + box.down);

type GraphProps = {
  layout: Layout;
  bySymbol: ReadonlyMap<string, Quantity>;
  chosen: string | null;
  onChoose: (symbol: string) => void;
};

function Graph({ layout: { nodes, edges, layers, rows }, bySymbol, chosen, onChoose }: GraphProps) {
  const placeOf = new Map(nodes.map((node) => [node.symbol, node]));
  const [width, height] = [leftOf(layers) - box.across, topOf(rows) - box.down];
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a region that scrolls must be reachable without a pointer
    <div role="region" aria-label="Drawing of the dependencies" tabIndex={0} className="graph-frame">
      <div className="relative" style={{ width, height }}>
        <svg aria-hidden="true" width={width} height={height} className="graph-lines">
          {edges.map(({ from, to }) => {
            const [a, b] = [placeOf.get(from), placeOf.get(to)];
            if (a === undefined || b === undefined) return null;
            const start = [leftOf(a.layer) + box.width, topOf(a.row) + box.height / 2] as const;
            const end = [leftOf(b.layer), topOf(b.row) + box.height / 2] as const;
            const bend = Math.max(box.across, end[0] - start[0]) / 2;
            const isLit = chosen === from || chosen === to;
            return (
              <path
                key={`${from} ${to}`}
                className={isLit ? 'is-lit' : undefined}
                d={`M${start.join()} C${start[0] + bend},${start[1]} ${end[0] - bend},${end[1]} ${end.join()}`}
              />
            );
          })}
        </svg>
        <ul>
          {[...nodes]
            .sort((a, b) => a.layer - b.layer || a.row - b.row)
            .map(({ symbol, layer, row }) => (
              <li key={symbol} className="absolute" style={{ left: leftOf(layer), top: topOf(row), width: box.width }}>
                <Node
                  symbol={symbol}
                  quantity={bySymbol.get(symbol)}
                  isChosen={symbol === chosen}
                  onChoose={() => onChoose(symbol)}
                />
              </li>
            ))}
        </ul>
      </div>
    </div>
  );
}

type NodeProps = { symbol: string; quantity: Quantity | undefined; isChosen: boolean; onChoose: () => void };

const kindWords = { input: 'input', constant: 'constant', derived: 'worked out' } as const;

function Node({ symbol, quantity, isChosen, onChoose }: NodeProps) {
  const kind = quantity?.kind ?? 'derived';
  return (
    <button
      type="button"
      aria-pressed={isChosen}
      title={quantity?.expression ?? kindWords[kind]}
      className={cx('graph-node', `is-${kind}`, isChosen && 'is-chosen')}
      style={{ height: box.height }}
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
