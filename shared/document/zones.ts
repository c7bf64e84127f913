import type { DocNode, Mark, Zone } from './define-block.ts';
import { allNodes } from './text-of.ts';

type Matrix = readonly [readonly [number, number, number], readonly [number, number, number]];
const determinant = ([[a, b], [d, e]]: Matrix): number => a * e - b * d;

/** What takes a point of one picture to the other, when each one's matrix takes its points to the same third picture. */
export function between(from: Matrix, to: Matrix): Matrix {
  const [[a, b, c], [d, e, f]] = to;
  const det = determinant(to);
  const inverse: Matrix = [
    [e / det, -b / det, (b * f - c * e) / det],
    [-d / det, a / det, (c * d - a * f) / det],
  ];
  const row = ([p, q, r]: readonly [number, number, number]): [number, number, number] => [
    p * from[0][0] + q * from[1][0],
    p * from[0][1] + q * from[1][1],
    p * from[0][2] + q * from[1][2] + r,
  ];
  return [row(inverse[0]), row(inverse[1])];
}

/** The zone's middle moves as the matrix says, its size as much as the matrix enlarges; it stays upright. */
export function movedZone([x, y, w, h]: Zone, matrix: Matrix): Zone {
  const grow = Math.sqrt(Math.abs(determinant(matrix)));
  const [mx, my] = [x + w / 2, y + h / 2];
  const [[a, b, c], [d, e, f]] = matrix;
  const [nw, nh] = [w * grow, h * grow];
  return [a * mx + b * my + c - nw / 2, d * mx + e * my + f - nh / 2, nw, nh].map(Math.round) as Zone;
}

/** The document with every zone moved to where the same print lies on another picture of the page. Text is left as it is. */
export function moveZones<N extends DocNode>(node: N, matrix: Matrix): N {
  const moved = <T extends { attrs?: Record<string, unknown> }>(holder: T): T => {
    const zone = holder.attrs?.['zone'] as Zone | null | undefined;
    return zone === undefined || zone === null
      ? holder
      : { ...holder, attrs: { ...holder.attrs, zone: movedZone(zone, matrix) } };
  };
  return {
    ...moved(node),
    ...(node.marks === undefined ? {} : { marks: node.marks.map((mark): Mark => moved(mark)) }),
    ...(node.content === undefined ? {} : { content: node.content.map((child) => moveZones(child, matrix)) }),
  };
}

export type BlockZone = { block: string; kind: string; box: Zone };

/** The zones of the blocks of a document, for drawing them over the scan. */
export const blockZones = (document: DocNode): BlockZone[] =>
  [...allNodes(document)].flatMap(({ type, attrs }) => {
    const [id, zone] = [attrs?.['id'], attrs?.['zone'] as Zone | null | undefined];
    return typeof id === 'string' && zone !== undefined && zone !== null ? [{ block: id, kind: type, box: zone }] : [];
  });
