import type { Node } from './nodes.ts';

/**
 * How often numbers of one manual would fall together by chance. Weighing is by expected false finds: hypotheses tried,
 * each weighted by how likely its parts belong together, times the width within which a number must fall, times how
 * densely the manual's numbers of that kind lie there. 1 means: expect one such coincidence in this manual.
 */
export type Chance = {
  /** Values per base unit around a value, itself left out. */
  densityAt: (node: Node) => number;
  /** The weight, of 1 in all, with which `other` is tried as a partner of `node`. */
  partner: (node: Node, other: Node) => number;
};

/**
 * What depends on each other in a manual is frequencies; values of parts and voltages come from lists of preferred values
 * and fall together all the time. Common practice, no source.
 */
export const beliefIn = (dimension: string): number => (dimension === 'frequency' ? 1 : 0.1);

/** Close and wide surroundings of a value, as shares of it. */
const close = 0.01;
const wide = 0.15;
/** Numbers this near in the order of reading are about the same thing. */
const reach = 6;
/** What of the weight goes to near numbers, to those of the page, and to all by how often they are printed. */
const shares = { near: 0.35, page: 0.25, any: 0.4 } as const;

export function chanceIn(nodes: readonly Node[]): Chance {
  const indexOf = new Map(nodes.map((node, index) => [node.at, index]));
  const at = (node: Node): number => indexOf.get(node.at) ?? -1;
  const values = Float64Array.from(nodes.map(({ value }) => Math.abs(value))).sort();
  const countWithin = (value: number, share: number): number =>
    lowerBound(values, value * (1 + share)) - lowerBound(values, value * (1 - share)) - 1;
  const densities = nodes.map((node) => {
    const value = Math.abs(node.value);
    // Half a number stands for those that might be: an empty neighbourhood is no proof.
    return Math.max(
      Math.max(0, countWithin(value, close)) / (2 * close * value),
      (0.5 + Math.max(0, countWithin(value, wide))) / (2 * wide * value),
    );
  });
  const weights = partnerWeights(nodes);
  return {
    densityAt: (node) => densities[at(node)] ?? Infinity,
    partner: (node, other) => weights[at(node) * nodes.length + at(other)] ?? 0,
  };
}

/** First place in ascending `values` that is not below `wanted`. */
export function lowerBound(values: Float64Array, wanted: number): number {
  let [low, high] = [0, values.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((values[middle] ?? Infinity) < wanted) low = middle + 1;
    else high = middle;
  }
  return low;
}

function partnerWeights(nodes: readonly Node[]): Float64Array {
  const weights = new Float64Array(nodes.length ** 2);
  const total = nodes.reduce((sum, { mentions }) => sum + Math.sqrt(mentions), 0);
  const onPage = new Map<string, number[]>();
  const byPlace = new Map<number, number>();
  for (const [at, { pages, places }] of nodes.entries()) {
    for (const page of pages) onPage.set(page, [...(onPage.get(page) ?? []), at]);
    for (const place of places) byPlace.set(place, at);
  }
  for (const [index, node] of nodes.entries()) {
    const start = index * nodes.length;
    for (const [at, { mentions }] of nodes.entries()) weights[start + at] = (shares.any * Math.sqrt(mentions)) / total;
    const near = new Set(node.places.flatMap((place) => neighbours(byPlace, place)));
    const paged = new Set([...node.pages].flatMap((page) => onPage.get(page) ?? []));
    for (const each of near) weights[start + each] = (weights[start + each] ?? 0) + shares.near / near.size;
    for (const each of paged) weights[start + each] = (weights[start + each] ?? 0) + shares.page / paged.size;
  }
  return weights;
}

function neighbours(byPlace: ReadonlyMap<number, number>, place: number): number[] {
  const found: number[] = [];
  for (let off = -reach; off <= reach; off += 1) {
    const at = off === 0 ? undefined : byPlace.get(place + off);
    if (at !== undefined) found.push(at);
  }
  return found;
}
