import type { ReactNode } from 'react';
import type { Layout } from './dependency-layout.ts';
import './calculations.css';

const box = { width: 190, height: 62, across: 64, down: 18 };
const leftOf = (layer: number): number => layer * (box.width + box.across);
const topOf = (row: number): number => row * (box.height + box.down);

type Props = {
  label: string;
  layout: Layout;
  /** Lines from and to this one are drawn strong. */
  chosen: string | null;
  /** What stands in the box of a symbol. */
  children: (symbol: string) => ReactNode;
};

/** Boxes in layers from left to right, joined by lines; in the order of the layers for whoever goes through by keyboard. */
export function Graph({ label, layout: { nodes, edges, layers, rows }, chosen, children }: Props) {
  const placeOf = new Map(nodes.map((node) => [node.symbol, node]));
  const [width, height] = [leftOf(layers) - box.across, topOf(rows) - box.down];
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a region that scrolls must be reachable without a pointer
    <div role="region" aria-label={label} tabIndex={0} className="graph-frame">
      <div className="relative" style={{ width, height }}>
        <svg aria-hidden="true" width={width} height={height} className="graph-lines">
          {edges.map(({ from, to }) => {
            const [a, b] = [placeOf.get(from), placeOf.get(to)];
            if (a === undefined || b === undefined) return null;
            const start = [leftOf(a.layer) + box.width, topOf(a.row) + box.height / 2] as const;
            const end = [leftOf(b.layer), topOf(b.row) + box.height / 2] as const;
            const bend = Math.max(box.across, end[0] - start[0]) / 2;
            return (
              <path
                key={`${from} ${to}`}
                className={chosen === from || chosen === to ? 'is-lit' : undefined}
                d={`M${start.join()} C${start[0] + bend},${start[1]} ${end[0] - bend},${end[1]} ${end.join()}`}
              />
            );
          })}
        </svg>
        <ul>
          {[...nodes]
            .sort((a, b) => a.layer - b.layer || a.row - b.row)
            .map(({ symbol, layer, row }) => (
              <li
                key={symbol}
                className="absolute"
                style={{ left: leftOf(layer), top: topOf(row), width: box.width, height: box.height }}
              >
                {children(symbol)}
              </li>
            ))}
        </ul>
      </div>
    </div>
  );
}
