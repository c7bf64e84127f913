import type { Editor } from '@tiptap/core';
import type { Node, ResolvedPos } from '@tiptap/pm/model';
import type { ZoneKind, ZoneReading } from '#shared/api/zone-readings.ts';
import { type DocNode, type Zone, zoneAround } from '#shared/document/define-block.ts';
import { inlineOf } from '#shared/reading/inline.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import { keepDoubts } from './settle-doubts.ts';

/** A part of the page that can be read again: where it stands in the document, and where on the scan. */
export type ZonePlace = {
  what: 'block' | 'cell' | 'table' | 'figure';
  position: number;
  zone: Zone;
  text: string;
  /** Mean of the confidences that its words carry, 0 to 100; null where none does. */
  confidence: number | null;
};

/** How a place is looked at unless the person says otherwise. */
export const usualKind: Record<ZonePlace['what'], ZoneKind> = {
  block: 'text',
  cell: 'line',
  table: 'text',
  figure: 'lettering',
};

/** What can be read again at the caret, the smallest first: a cell and its table, a block of text, a chosen figure. */
export function zonePlaces(editor: Editor): ZonePlace[] {
  const { $from } = editor.state.selection;
  const chosen = $from.nodeAfter;
  if (chosen?.type.name === 'figure') return placesOf({ node: chosen, position: $from.pos }, 'figure');
  const table = ancestor($from, ({ type }) => type.name === 'table');
  if (table !== null) {
    const cell = ancestor($from, ({ type }) => type.name === 'tableCell' || type.name === 'tableHeader');
    return [...(cell === null ? [] : cellPlaces(cell, table.node, $from)), ...placesOf(table, 'table')];
  }
  const block = ancestor($from, ({ isTextblock }) => isTextblock);
  return block === null ? [] : placesOf(block, 'block');
}

type Found = { node: Node; position: number };

function ancestor($from: ResolvedPos, is: (node: Node) => boolean): (Found & { depth: number }) | null {
  for (let depth = $from.depth; depth > 0; depth -= 1)
    if (is($from.node(depth))) return { node: $from.node(depth), position: $from.before(depth), depth };
  return null;
}

const zoneOf = (node: Node): Zone | null => (node.attrs['zone'] as Zone | null | undefined) ?? null;

function placesOf({ node, position }: Found, what: ZonePlace['what'], zone = zoneOf(node)): ZonePlace[] {
  if (zone === null) return [];
  const text =
    what === 'figure' ? String(node.attrs['description'] ?? '') : node.textBetween(0, node.content.size, ' ', ' ');
  return [{ what, position, zone, text, confidence: confidenceOf(node) }];
}

/** A cell that nothing was read in has no zone of its own: it lies where its row meets its column. */
function cellPlaces(cell: Found & { depth: number }, table: Node, $from: ResolvedPos): ZonePlace[] {
  const own = zoneOf(cell.node);
  if (own !== null) return placesOf(cell, 'cell');
  const row = zoneOf($from.node(cell.depth - 1));
  const index = $from.index(cell.depth - 1);
  const column: Zone[] = [];
  table.forEach((each) => {
    const zone = each.childCount > index ? zoneOf(each.child(index)) : null;
    if (zone !== null) column.push(zone);
  });
  if (row === null || column.length === 0) return [];
  const [x, , w] = zoneAround(column);
  return placesOf(cell, 'cell', [x, row[1], w, row[3]]);
}

function confidenceOf(node: Node): number | null {
  let [letters, sum] = [0, 0];
  node.descendants((child) => {
    const confidence = child.marks.find(({ type }) => type.name === 'word')?.attrs['confidence'] as number | undefined;
    if (confidence === undefined) return;
    letters += child.nodeSize;
    sum += confidence * child.nodeSize;
  });
  return letters === 0 ? null : sum / letters;
}

/** Puts a reading in the place it was made of, in one step that can be undone. Its doubts stay doubts. */
export function takeZoneReading(editor: Editor, place: ZonePlace, { words, blocks }: ZoneReading): void {
  const { what } = place;
  const { node, position } = whereNow(editor.state.doc, place);
  if (node === null) return;
  const range = { from: position, to: position + node.nodeSize };
  const chain = editor.chain().setMeta(keepDoubts, true);
  if (what === 'figure') {
    const description = words.map(({ text }) => text).join(' ');
    chain.command(({ tr }) => tr.setNodeAttribute(position, 'description', description) !== null).run();
  } else if (what === 'table') {
    chain.insertContentAt(range, inPlaceOf(node, blocks as DocNode[])).run();
  } else {
    const content = inlineOf(withoutMarker(node, words));
    const inside = { from: range.from + 1, to: range.to - 1 };
    const paragraph = { type: 'paragraph', content };
    chain.insertContentAt(inside, what === 'cell' ? [paragraph] : content).run();
  }
}

/** Text may have been written ahead of the place while it was being read: it is then found again by its zone. */
function whereNow(doc: Node, { position, zone }: ZonePlace): { node: Node | null; position: number } {
  const isSame = (node: Node | null): boolean => node !== null && zoneOf(node)?.join() === zone.join();
  const there = position < doc.content.size ? doc.nodeAt(position) : null;
  if (isSame(there)) return { node: there, position };
  let found: { node: Node; position: number } | null = null;
  doc.descendants((node, at) => {
    if (found === null && isSame(node)) found = { node, position: at };
    return found === null;
  });
  const isEmptyCell = there?.type.spec['tableRole'] === 'cell' && zoneOf(there) === null;
  return found ?? { node: isEmptyCell ? there : null, position };
}

/** The first block of the same kind goes on under the name that stands there; the others are new. */
function inPlaceOf(node: Node, blocks: readonly DocNode[]): DocNode[] {
  const same = blocks.findIndex(({ type }) => type === node.type.name);
  return blocks.map((block, index) => ({
    ...block,
    attrs: { ...block.attrs, id: index === same ? (node.attrs['id'] as string | null) : null },
  }));
}

/** A step keeps its marker apart from its text; the scan shows both. */
function withoutMarker(node: Node, words: readonly ReadingWord[]): readonly ReadingWord[] {
  const marker = node.type.name === 'step' ? String(node.attrs['marker'] ?? '') : '';
  return marker !== '' && words[0]?.text === marker ? words.slice(1) : words;
}
