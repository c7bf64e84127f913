import { diffArrays } from 'diff';
import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { around } from '#shared/document/live-values.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { allNodes, placedTexts } from '#shared/document/text-of.ts';
import { isClose } from '#shared/reading/look-alike.ts';
import { columnMeaning, tableKind } from '#shared/reading/type-columns.ts';
import type { Block, ManualPage, PartsTableBlock, TableBlock } from './content/types.ts';

type Word = { text: string; zone: Zone | null };
type Draft = { node: DocNode; words: Word[] };

/**
 * Corrects a page as an editor would who has the printed words before them: the words are set right, block by block, and
 * each keeps the place on the scan where recognition found it.
 */
export function correctPage(read: PageDocument, page: ManualPage): PageDocument {
  const places = placesOf(read);
  const figures = [...allNodes(read)].filter(({ type }) => type === 'figure');
  const drafts = page.blocks.flatMap((block) => draftsOf(block, figures));
  takePlaces(
    drafts.flatMap(({ words }) => words),
    places,
  );
  let count = 0;
  const content = drafts.map(({ node }) => finished(node, () => `e${(count += 1)}`));
  return { type: 'doc', attrs: { version: 1 }, content };
}

const placesOf = (read: PageDocument): Word[] =>
  placedTexts(read).flatMap(({ text, zone }) =>
    zone === null
      ? []
      : text
          .split(/\s+/)
          .filter(Boolean)
          .map((word) => ({ text: word, zone })),
  );

/** Lines the printed words up with the recognised ones; runs that differ but are equally long are matched in order. */
function takePlaces(printed: Word[], read: Word[]): void {
  const parts = diffArrays(
    printed.map(({ text }) => text),
    read.map(({ text }) => text),
    { comparator: (a, b) => a === b || isClose(a.toLowerCase(), b.toLowerCase()) },
  );
  let [at, from] = [0, 0];
  let [missing, spare]: [Word[], Word[]] = [[], []];
  const settle = (): void => {
    if (missing.length === spare.length) missing.forEach((word, index) => (word.zone = spare[index]?.zone ?? null));
    [missing, spare] = [[], []];
  };
  for (const { removed, added, count } of parts) {
    if (removed) missing = printed.slice(at, at + count);
    else if (added) spare = read.slice(from, from + count);
    else {
      settle();
      for (let index = 0; index < count; index += 1) {
        const word = printed[at + index];
        if (word !== undefined) word.zone = read[from + index]?.zone ?? null;
      }
    }
    if (!added) at += count;
    if (!removed) from += count;
  }
  settle();
}

const wordsOf = (text: string): Word[] =>
  text
    .split(/\s+/)
    .filter(Boolean)
    .map((word) => ({ text: word, zone: null }));

/** A node whose content is filled in once its words have their places. */
function wordy(type: string, attrs: Record<string, unknown>, text: string): Draft {
  const words = wordsOf(text);
  return { node: { type, attrs: { ...attrs, words } }, words };
}

function draftsOf(block: Block, figures: DocNode[]): Draft[] {
  switch (block.kind) {
    case 'head':
    case 'foot':
      return [wordy('running', { place: block.kind }, block.text)];
    case 'heading':
      return [wordy('heading', { level: block.level }, block.text)];
    case 'paragraph':
      return [wordy('paragraph', {}, block.text)];
    case 'step':
      return [wordy('step', { marker: block.marker, depth: block.depth - 1 }, block.text)];
    case 'warning':
    case 'caution':
    case 'note': {
      const inner = wordy('paragraph', {}, block.text);
      return [{ node: { type: 'admonition', attrs: { kind: block.kind }, content: [inner.node] }, words: inner.words }];
    }
    case 'figure':
      return [
        { node: { ...figures.shift(), type: 'figure' }, words: [] },
        wordy('caption', { of: 'figure' }, block.caption),
      ];
    case 'parts-table':
    case 'table':
      return [wordy('caption', { of: 'table' }, block.caption), tableDraft(block)];
  }
}

function tableDraft(block: PartsTableBlock | TableBlock): Draft {
  const bodies = block.kind === 'table' ? block.rows.map((cells) => ({ kind: 'body' as const, cells })) : block.rows;
  const words: Word[] = [];
  const cell = (type: string, text: string): DocNode => {
    const draft = wordy('paragraph', { id: null }, text);
    words.push(...draft.words);
    return { type, attrs: { colspan: 1, rowspan: 1, colwidth: null }, content: [draft.node] };
  };
  const width = block.columns.length;
  const columns = block.columns.map((column, index) => ({
    heading: column.heading,
    meaning:
      'meaning' in column
        ? column.meaning
        : columnMeaning(
            column.heading,
            bodies.map(({ cells }) => cells[index] ?? ''),
          ),
  }));
  const content = [
    { type: 'tableRow', attrs: { role: 'head' }, content: columns.map(({ heading }) => cell('tableHeader', heading)) },
    ...bodies.map(({ kind, cells }) => ({
      type: 'tableRow',
      attrs: { role: kind },
      content: Array.from({ length: width }, (_, index) => cell('tableCell', cells[index] ?? '')),
    })),
  ];
  const kind = block.kind === 'parts-table' ? 'parts' : tableKind(columns.map(({ meaning }) => meaning));
  return { node: { type: 'table', attrs: { kind, columns }, content }, words };
}

/** Sets in the words, and gives each block the zone that its words take up. */
function finished(node: DocNode, nextId: () => string): DocNode {
  const { words, ...attrs } = (node.attrs ?? {}) as { words?: Word[] } & Record<string, unknown>;
  const isCellText = attrs['id'] === null;
  const content = words === undefined ? (node.content ?? []).map((child) => finished(child, nextId)) : inlineOf(words);
  const zones = words === undefined ? content.map((child) => child.attrs?.['zone']) : words.map(({ zone }) => zone);
  const zone = node.type === 'figure' ? attrs['zone'] : around(zones.filter(Boolean) as Zone[]);
  const hasId = !['tableRow', 'tableCell', 'tableHeader'].includes(node.type);
  return {
    type: node.type,
    attrs: { ...attrs, zone: zone ?? null, ...(hasId ? { id: isCellText ? null : nextId() } : {}) },
    ...(content.length > 0 ? { content } : {}),
  };
}

const inlineOf = (words: Word[]): DocNode[] =>
  words.flatMap(({ text, zone }, index): DocNode[] => [
    ...(index === 0 ? [] : [{ type: 'text', text: ' ' }]),
    { type: 'text', text, ...(zone === null ? {} : { marks: [{ type: 'word', attrs: { zone, confidence: 100 } }] }) },
  ]);
