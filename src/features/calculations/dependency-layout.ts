/** What rests on what: each symbol with those that its expression names. */
export type Links = ReadonlyMap<string, readonly string[]>;

export type Placed = { symbol: string; layer: number; row: number };
export type Layout = { nodes: Placed[]; edges: { from: string; to: string }[]; layers: number; rows: number };

/** Sweeps that sort each layer by where its neighbours stand; more change little (Sugiyama et al., IEEE SMC-11, 1981). */
const sweeps = 4;

/**
 * Places the symbols in layers from what is given to what is worked out, each behind all that it rests on, with lines
 * crossing little. Symbols must come in an order in which each follows what it rests on.
 */
export function layoutOf(order: readonly string[], links: Links): Layout {
  const layerOf = new Map<string, number>();
  for (const symbol of order) {
    const on = (links.get(symbol) ?? []).filter((each) => layerOf.has(each));
    layerOf.set(symbol, on.length === 0 ? 0 : Math.max(...on.map((each) => layerOf.get(each) ?? 0)) + 1);
  }
  const layers: string[][] = [];
  for (const symbol of order) (layers[layerOf.get(symbol) ?? 0] ??= []).push(symbol);
  const edges = order.flatMap((to) =>
    (links.get(to) ?? []).filter((from) => layerOf.has(from)).map((from) => ({ from, to })),
  );
  const rowOf = new Map<string, number>();
  const number = (layer: readonly string[]): void => layer.forEach((symbol, row) => rowOf.set(symbol, row));
  layers.forEach(number);
  for (let sweep = 0; sweep < sweeps; sweep += 1) {
    const isDown = sweep % 2 === 0;
    for (const layer of isDown ? layers : layers.toReversed()) {
      layer.sort((a, b) => middle(a, edges, { rowOf, isDown }) - middle(b, edges, { rowOf, isDown }));
      number(layer);
    }
  }
  return {
    nodes: order.map((symbol) => ({ symbol, layer: layerOf.get(symbol) ?? 0, row: rowOf.get(symbol) ?? 0 })),
    edges,
    layers: layers.length,
    rows: Math.max(0, ...layers.map(({ length }) => length)),
  };
}

type Sweep = { rowOf: ReadonlyMap<string, number>; isDown: boolean };

/** The mean row of the neighbours on the side that the sweep comes from; its own row where there are none. */
function middle(symbol: string, edges: Layout['edges'], { rowOf, isDown }: Sweep): number {
  const neighbours = edges.flatMap(({ from, to }) => {
    if (isDown) return to === symbol ? [from] : [];
    return from === symbol ? [to] : [];
  });
  if (neighbours.length === 0) return rowOf.get(symbol) ?? 0;
  return neighbours.reduce((sum, each) => sum + (rowOf.get(each) ?? 0), 0) / neighbours.length;
}

/** A symbol with everything that it rests on and everything that rests on it, in the given order. */
export function kinOf(symbol: string, order: readonly string[], links: Links): string[] {
  const kin = new Set([symbol]);
  for (const each of order.toReversed()) if (kin.has(each)) links.get(each)?.forEach((on) => kin.add(on));
  const behind = new Set([symbol]);
  for (const each of order) if (links.get(each)?.some((on) => behind.has(on)) === true) behind.add(each);
  return order.filter((each) => kin.has(each) || behind.has(each));
}
