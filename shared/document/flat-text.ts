import { type DocNode, type Zone, zoneAround } from './define-block.ts';
import { textOf } from './text-of.ts';

/** A stretch of a page's flat text: offsets from and up to. */
export type FlatStretch = { from: number; to: number };

export type FlatPiece = FlatStretch & {
  /** A live value counts as its printed text, however it is shown. */
  isLive: boolean;
  /** Its own zone, else that of the nearest thing around it. */
  zone: Zone | null;
  /** The nearest block around it that has a name. */
  block: string | null;
  /** Numbers the runs of text: a paragraph, a step, the paragraph of a cell. */
  run: number;
};

export type FlatBlock = FlatStretch & { id: string; zone: Zone | null };

/** All words of a page as one text, each run of them on a line of its own, and what stands where in it. */
export type FlatText = { text: string; pieces: FlatPiece[]; blocks: FlatBlock[] };

type Around = { zone: Zone | null; block: string | null };

export function flatTextOf(document: DocNode): FlatText {
  const flat: FlatText = { text: '', pieces: [], blocks: [] };
  let run = 0;
  const visit = (node: DocNode, around: Around): void => {
    if (node.type === 'hardBreak') flat.text += '\n';
    else if (node.type === 'text' || node.type === 'liveValue') putPiece(flat, node, { ...around, run });
    else {
      const id = typeof node.attrs?.['id'] === 'string' ? node.attrs['id'] : null;
      const own = zoneOf(node.attrs);
      const first = flat.pieces.length;
      run += 1;
      for (const child of node.content ?? []) visit(child, { zone: own ?? around.zone, block: id ?? around.block });
      run += 1;
      if (id !== null) flat.blocks.push({ id, zone: own, ...stretchOf(flat, first) });
    }
  };
  visit(document, { zone: null, block: null });
  return flat;
}

const zoneOf = (attrs: Record<string, unknown> | undefined): Zone | null =>
  Array.isArray(attrs?.['zone']) ? (attrs['zone'] as Zone) : null;

function putPiece(flat: FlatText, node: DocNode, { zone, block, run }: Around & { run: number }): void {
  const last = flat.pieces.at(-1);
  if (last !== undefined && last.run !== run) flat.text += '\n';
  const from = flat.text.length;
  flat.text += textOf(node);
  const word = node.marks?.find(({ type }) => type === 'word');
  const own = zoneOf(word?.attrs) ?? zoneOf(node.attrs);
  const isLive = node.type === 'liveValue';
  flat.pieces.push({ from, to: flat.text.length, isLive, zone: own ?? zone, block, run });
}

function stretchOf({ text, pieces }: FlatText, first: number): FlatStretch {
  const [start, end] = [pieces[first], pieces.at(-1)];
  return start === undefined || end === undefined
    ? { from: text.length, to: text.length }
    : { from: start.from, to: end.to };
}

/** Pieces that a stretch touches; an empty stretch touches what it stands in or beside. */
export const piecesIn = ({ pieces }: FlatText, { from, to }: FlatStretch): FlatPiece[] =>
  pieces.filter((piece) => (from === to ? piece.from <= from && piece.to >= from : piece.from < to && piece.to > from));

/** The rectangle of the scan that a stretch came from; null where a person wrote it without a place. */
export function zoneOfStretch(flat: FlatText, stretch: FlatStretch): Zone | null {
  const zones = piecesIn(flat, stretch).flatMap(({ zone, from, to }) =>
    zone === null || flat.text.slice(from, to).trim() === '' ? [] : [zone],
  );
  return zones.length === 0 ? null : zoneAround(zones);
}
