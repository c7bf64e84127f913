import { type DocNode, type Zone, zoneAround } from '#shared/document/define-block.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { currentVersion } from '#shared/document/upgrades.ts';
import type { LineKind } from './classify-line.ts';
import { findTables } from './find-tables.ts';
import { gatherLines } from './gather-lines.ts';
import { inlineOf } from './inline.ts';
import { type Line, bottomOf, lineFrom, linesOf, median, middleOf } from './lines.ts';
import { overlap } from './picture/figures.ts';
import type { Reading } from './reading.ts';
import { withoutSpecks } from './specks.ts';
import { tableBlock } from './table-block.ts';

type Piece = { node: DocNode; zone: Zone };

/** Running heads and feet stand within this share of the page's height from its edge, apart from the text. */
const marginShare = 0.075;
const runningMostWords = 12;

/** Makes the page document of a reading. The same reading always gives the same document, ids included. */
export function documentOf(reading: Reading): PageDocument {
  let count = 0;
  const nextId = (): string => `b${(count += 1)}`;
  const words = withoutSpecks(reading.words);
  const { figures } = reading;
  const tables = findTables(words).filter(({ zone }) => !figures.some((figure) => overlap(zone, figure) > 0.5));
  const isInside = (zone: Zone, zones: Zone[]): boolean => zones.some((other) => overlap(zone, other) > 0.5);
  const taken = [...tables.map(({ zone }) => zone), ...figures];
  const lines = linesOf(words.filter(({ box }) => !isInside(box, taken)));
  const { body, running } = partRunning(lines, reading);
  const labels = (zone: Zone): string =>
    words
      .filter(({ box }) => isInside(box, [zone]))
      .map(({ text }) => text)
      .join(' ')
      .slice(0, 500);
  const pieces: Piece[] = [
    ...running.filter(({ node }) => node.attrs?.['place'] === 'head'),
    ...inOrder([
      ...joinAdmonitions(gatherLines(body).map(({ kind, lines: own }) => pieceOf(kind, own))),
      ...tables.map((table) => ({ node: tableBlock(table, ''), zone: table.zone })),
      ...figures.map((zone) => ({ node: { type: 'figure', attrs: { zone, description: labels(zone) } }, zone })),
    ]),
    ...running.filter(({ node }) => node.attrs?.['place'] === 'foot'),
  ];
  const content = pieces.map(({ node }) => withIds(node, nextId));
  const empty: DocNode = { type: 'paragraph', attrs: { id: nextId(), zone: null } };
  return { type: 'doc', attrs: { version: currentVersion }, content: content.length > 0 ? content : [empty] };
}

const withIds = (node: DocNode, nextId: () => string): DocNode => ({
  ...node,
  attrs: { ...node.attrs, id: nextId() },
  ...(node.type === 'admonition' ? { content: (node.content ?? []).map((child) => withIds(child, nextId)) } : {}),
});

/** Text keeps the engine's order; tables and figures go before the first piece of text that starts below them. */
function inOrder(pieces: Piece[]): Piece[] {
  const isText = ({ node }: Piece): boolean => node.type !== 'table' && node.type !== 'figure';
  const placed = pieces.filter(isText);
  for (const piece of pieces.filter((each) => !isText(each))) {
    const middle = middleOf(piece.zone);
    const at = placed.findIndex(({ zone }) => zone[1] > middle);
    placed.splice(at < 0 ? placed.length : at, 0, piece);
  }
  return placed;
}

function partRunning(lines: Line[], { width, height }: Reading): { body: Line[]; running: Piece[] } {
  const usual = median(lines.map(({ zone }) => zone[3]));
  const isAlone = (line: Line): boolean =>
    lines.every(
      (other) =>
        other === line || Math.abs(middleOf(other.zone) - middleOf(line.zone)) > usual * 2.2 || sameRow(other, line),
    );
  const placeOf = (line: Line): 'head' | 'foot' | null => {
    if (line.words.length > runningMostWords || line.zone[2] > width * 0.9) return null;
    if (bottomOf(line.zone) < height * marginShare) return 'head';
    if (line.zone[1] > height * (1 - marginShare)) return 'foot';
    if (line.zone[1] < height * marginShare * 1.4 && isAlone(line) && line === lines[0]) return 'head';
    return null;
  };
  const running: { place: 'head' | 'foot'; line: Line }[] = [];
  const body: Line[] = [];
  for (const line of lines) {
    const place = placeOf(line);
    const beside = running.find((other) => sameRow(other.line, line));
    if (place === null) body.push(line);
    else if (beside === undefined) running.push({ place, line });
    else beside.line = lineFrom([...beside.line.words, ...line.words]);
  }
  const pieces = running.map(({ place, line: { words, zone } }): Piece => ({
    node: { type: 'running', attrs: { zone, place }, content: inlineOf(words) },
    zone,
  }));
  return { body, running: pieces };
}

const sameRow = (a: Line, b: Line): boolean => Math.abs(middleOf(a.zone) - middleOf(b.zone)) < a.zone[3] * 0.5;

function pieceOf(kind: LineKind, lines: Line[]): Piece {
  const zone = zoneAround(lines.map((line) => line.zone));
  const words = lines.flatMap((line) => line.words);
  if (kind.kind === 'step') {
    const attrs = { zone, marker: kind.marker, depth: kind.depth };
    return { zone, node: { type: 'step', attrs, content: inlineOf(words.slice(kind.markerWords)) } };
  }
  if (kind.kind === 'admonition-word')
    return { zone, node: { type: 'admonition', attrs: { zone, kind: kind.word }, content: [] } };
  if (kind.kind === 'heading')
    return { zone, node: { type: 'heading', attrs: { zone, level: kind.level }, content: inlineOf(words) } };
  if (kind.kind === 'caption')
    return { zone, node: { type: 'caption', attrs: { zone, of: kind.of }, content: inlineOf(words) } };
  return { zone, node: { type: 'paragraph', attrs: { zone }, content: inlineOf(words) } };
}

/** The paragraph behind WARNING, CAUTION or NOTE is what it says; with nothing behind it, the word itself is kept as a heading. */
function joinAdmonitions(pieces: Piece[]): Piece[] {
  const joined: Piece[] = [];
  for (let at = 0; at < pieces.length; at += 1) {
    const piece = pieces[at];
    if (piece === undefined) continue;
    const next = pieces[at + 1];
    if (piece.node.type !== 'admonition') joined.push(piece);
    else if (next?.node.type === 'paragraph') {
      const zone = zoneAround([piece.zone, next.zone]);
      joined.push({ zone, node: { ...piece.node, attrs: { ...piece.node.attrs, zone }, content: [next.node] } });
      at += 1;
    } else {
      const text = String(piece.node.attrs?.['kind']).toUpperCase();
      joined.push({
        zone: piece.zone,
        node: { type: 'heading', attrs: { zone: piece.zone, level: 3 }, content: [{ type: 'text', text }] },
      });
    }
  }
  return joined;
}
