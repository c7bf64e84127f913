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
export function Graph({ label, layout: { nodes, lines, layers, rows }, chosen, children }: Props) {
  const placeOf = new Map(nodes.map((node) => [node.symbol, node]));
  const [width, height] = [leftOf(layers) - box.across, topOf(rows) - box.down];
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a region that scrolls must be reachable without a pointer
    <div role="region" aria-label={label} tabIndex={0} className="graph-frame">
      <div className="relative" style={{ width, height }}>
        <svg aria-hidden="true" width={width} height={height} className="graph-lines">
          {lines.map((line) => {
            const [from, to] = [placeOf.get(line.from), placeOf.get(line.to)];
            if (from === undefined || to === undefined) return null;
            const isLit = chosen === line.from || chosen === line.to;
            return (
              <path
                key={`${line.from} ${line.to}`}
                className={isLit ? 'is-lit' : undefined}
                d={pathThrough([from, ...line.through, to])}
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

/** From the right edge of the first box, straight through the places kept between, to the left edge of the last. */
function pathThrough(places: readonly { layer: number; row: number }[]): string {
  const bend = box.across / 2;
  return places
    .slice(1)
    .map((place, at) => {
      const before = places[at] ?? place;
      const [x, y] = [leftOf(before.layer) + box.width, topOf(before.row) + box.height / 2];
      const [nextX, nextY] = [leftOf(place.layer), topOf(place.row) + box.height / 2];
      const isThrough = at < places.length - 2;
      const start = at === 0 ? `M${x},${y}` : '';
      return `${start} C${x + bend},${y} ${nextX - bend},${nextY} ${nextX},${nextY}${isThrough ? ` H${nextX + box.width}` : ''}`;
    })
    .join(' ');
}
