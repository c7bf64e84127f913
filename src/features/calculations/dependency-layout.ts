/** What rests on what: each symbol with those that its expression names. */
export type Links = ReadonlyMap<string, readonly string[]>;

export type Placed = { symbol: string; layer: number; row: number };
/** A line runs through the empty places that are kept for it in the layers between. */
export type Line = { from: string; to: string; through: { layer: number; row: number }[] };
export type Layout = { nodes: Placed[]; lines: Line[]; layers: number; rows: number };

/** Sweeps that sort each layer by where its neighbours stand; more change little (Sugiyama et al., IEEE SMC-11, 1981). */
const sweeps = 6;

/**
 * Places the symbols in layers from what is given to what is worked out, each behind all that it rests on, with lines
 * crossing little and never running through a symbol. What rests on nothing stands right before what it feeds.
 */
export function layoutOf(order: readonly string[], links: Links): Layout {
  const edges = edgesAmong(order, links);
  const layerOf = layersOf(order, edges);
  const cells = new Map(order.map((symbol) => [symbol, layerOf.get(symbol) ?? 0]));
  const hops: Edge[] = [];
  const chains = edges.map(({ from, to }) => {
    const between: string[] = [];
    for (let layer = (layerOf.get(from) ?? 0) + 1; layer < (layerOf.get(to) ?? 0); layer += 1) {
      const place = `${from} > ${to} @ ${layer}`;
      cells.set(place, layer);
      between.push(place);
    }
    const chain = [from, ...between, to];
    for (let at = 1; at < chain.length; at += 1) hops.push({ from: chain[at - 1] ?? '', to: chain[at] ?? '' });
    return { from, to, between };
  });
  const rowOf = rowsOf(cells, hops);
  const placeOf = (cell: string) => ({ layer: cells.get(cell) ?? 0, row: rowOf.get(cell) ?? 0 });
  return {
    nodes: order.map((symbol) => ({ symbol, ...placeOf(symbol) })),
    lines: chains.map(({ from, to, between }) => ({ from, to, through: between.map(placeOf) })),
    layers: Math.max(-1, ...cells.values()) + 1,
    rows: Math.max(-1, ...rowOf.values()) + 1,
  };
}

type Edge = { from: string; to: string };

function edgesAmong(order: readonly string[], links: Links): Edge[] {
  const seen = new Set<string>();
  return order.flatMap((to) => {
    const on = [...new Set(links.get(to) ?? [])].filter((from) => seen.has(from));
    seen.add(to);
    return on.map((from) => ({ from, to }));
  });
}

function layersOf(order: readonly string[], edges: readonly Edge[]): Map<string, number> {
  const layerOf = new Map(order.map((symbol) => [symbol, 0]));
  const rank = new Map(order.map((symbol, at) => [symbol, at]));
  const sorted = [...edges].sort((a, b) => (rank.get(a.to) ?? 0) - (rank.get(b.to) ?? 0));
  for (const { from, to } of sorted) layerOf.set(to, Math.max(layerOf.get(to) ?? 0, (layerOf.get(from) ?? 0) + 1));
  const fed = new Set(edges.map(({ to }) => to));
  for (const symbol of order) {
    const behind = edges.filter(({ from }) => from === symbol).map(({ to }) => layerOf.get(to) ?? 0);
    if (!fed.has(symbol) && behind.length > 0) layerOf.set(symbol, Math.min(...behind) - 1);
  }
  return layerOf;
}

/** The row of each cell in its layer, sorted by where the cells stand that it is joined to. */
function rowsOf(cells: ReadonlyMap<string, number>, hops: readonly Edge[]): Map<string, number> {
  const layers: string[][] = [];
  for (const [cell, layer] of cells) (layers[layer] ??= []).push(cell);
  const before = neighbours(hops.map(({ from, to }) => [to, from]));
  const behind = neighbours(hops.map(({ from, to }) => [from, to]));
  const rowOf = new Map<string, number>();
  const number = (layer: readonly string[]): void => layer.forEach((cell, row) => rowOf.set(cell, row));
  layers.forEach(number);
  for (let sweep = 0; sweep < sweeps; sweep += 1) {
    const isDown = sweep % 2 === 0;
    const beside = isDown ? before : behind;
    const middle = (cell: string): number => {
      const rows = (beside.get(cell) ?? []).map((each) => rowOf.get(each) ?? 0);
      return rows.length === 0 ? (rowOf.get(cell) ?? 0) : rows.reduce((sum, row) => sum + row, 0) / rows.length;
    };
    for (const layer of isDown ? layers : layers.toReversed()) {
      layer.sort((a, b) => middle(a) - middle(b));
      number(layer);
    }
  }
  return rowOf;
}

function neighbours(pairs: readonly (readonly [string, string])[]): Map<string, string[]> {
  const map = new Map<string, string[]>();
  for (const [of, other] of pairs) map.set(of, [...(map.get(of) ?? []), other]);
  return map;
}

/** A symbol with everything that it rests on and everything that rests on it, in the given order. */
export function kinOf(symbol: string, order: readonly string[], links: Links): string[] {
  const kin = new Set([symbol]);
  for (const each of order.toReversed()) if (kin.has(each)) links.get(each)?.forEach((on) => kin.add(on));
  const behind = new Set([symbol]);
  for (const each of order) if (links.get(each)?.some((on) => behind.has(on)) === true) behind.add(each);
  return order.filter((each) => kin.has(each) || behind.has(each));
}
