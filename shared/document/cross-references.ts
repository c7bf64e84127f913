import { type DocNode, type Zone, textAttribute } from './define-block.ts';
import type { ManualPart } from './parts-of-manual.ts';
import { textOf } from './text-of.ts';

export const referenceKinds = ['paragraph', 'figure', 'table', 'page', 'part'] as const;
export type ReferenceKind = (typeof referenceKinds)[number];

/** What a text points at, and where the name of it stands in the text: "see paragraph 4-12" names "4-12". */
export type Reference = { kind: ReferenceKind; name: string; from: number; to: number };
/** Something of the manual that texts can point at, and where it is. */
export type Target = { kind: ReferenceKind; name: string; pageId: string; pageLabel: string; zone: Zone | null };

const number = String.raw`(\d+(?:[-.]\d+)*[a-z]?)`;
const patterns: readonly { kind: ReferenceKind; pattern: RegExp }[] = [
  { kind: 'paragraph', pattern: new RegExp(String.raw`\b(?:para(?:graph)?s?|sect(?:ion)?s?)\.?\s+${number}`, 'giu') },
  { kind: 'figure', pattern: new RegExp(String.raw`\bfig(?:ure)?s?\.?\s+${number}`, 'giu') },
  { kind: 'table', pattern: new RegExp(String.raw`\btables?\s+${number}`, 'giu') },
  { kind: 'page', pattern: /\bpages?\s+(\d+-\d+|\d+|[ivx]{1,5})\b/giu },
  { kind: 'part', pattern: /(?<![\w-])([A-Z]{1,3}\d{1,4}[A-Z]?)(?![\w-])/gu },
];

/** Everything that a text points at. A designator is one only if the manual lists such a part: see `resolve`. */
export const referencesIn = (text: string): Reference[] =>
  patterns.flatMap(({ kind, pattern }) =>
    [...text.matchAll(pattern)].map((match) => {
      const name = match[1] ?? '';
      const to = match.index + match[0].length;
      return { kind, name: kind === 'part' ? name : name.toLowerCase(), from: to - name.length, to };
    }),
  );

const headingNumber = new RegExp(String.raw`^\s*(?:section\s+)?${number}\.?(?=\s|$)`, 'iu');
const captionNumber = new RegExp(String.raw`^\s*(fig(?:ure)?|table)\.?\s+${number}`, 'iu');

/** Blocks that are pointed at are not read for what they point at: a caption names itself. */
const isTargetBlock = ({ type }: DocNode): boolean => type === 'heading' || type === 'caption' || type === 'running';

type Page = { pageId: string; label: string; document: DocNode };

/** All that can be pointed at: numbered headings and paragraphs, captions, pages, and the parts of the parts lists. */
export function targetsOf(pages: readonly Page[], parts: readonly ManualPart[]): Target[] {
  const targets: Target[] = [];
  const zoneOfTable = new Map<string, Zone | null>();
  for (const { pageId, label, document } of pages) {
    const place = { pageId, pageLabel: label };
    targets.push({ kind: 'page', name: label.toLowerCase(), zone: null, ...place });
    for (const block of document.content ?? []) {
      const zone = (block.attrs?.['zone'] as Zone | null | undefined) ?? null;
      if (block.type === 'table') zoneOfTable.set(`${pageId} ${String(block.attrs?.['id'])}`, zone);
      const named = nameOf(block);
      if (named !== null) targets.push({ ...named, zone, ...place });
    }
  }
  for (const { designators, pageId, pageLabel, tableId } of parts)
    for (const name of designators) {
      const zone = zoneOfTable.get(`${pageId} ${tableId}`) ?? null;
      targets.push({ kind: 'part', name, pageId, pageLabel, zone });
    }
  return targets;
}

function nameOf(block: DocNode): Pick<Target, 'kind' | 'name'> | null {
  if (block.type === 'caption') return captioned(textOf(block));
  if (block.type === 'heading') return numbered(textOf(block));
  const own = block.type === 'step' ? `${textAttribute(block, 'marker')} ${textOf(block)}` : textOf(block);
  const found = block.type === 'step' || block.type === 'paragraph' ? numbered(own) : null;
  // "2 turns of wire" begins with a number, but a paragraph's own number has parts: 4-12, 5.1.
  return found !== null && /[-.]/.test(found.name) ? found : null;
}

function captioned(text: string): Pick<Target, 'kind' | 'name'> | null {
  const [, what = '', name = ''] = captionNumber.exec(text) ?? [];
  return name === '' ? null : { kind: /^t/i.test(what) ? 'table' : 'figure', name: name.toLowerCase() };
}

function numbered(text: string): Pick<Target, 'kind' | 'name'> | null {
  const name = headingNumber.exec(text)?.[1];
  return name === undefined ? null : { kind: 'paragraph', name: name.toLowerCase() };
}

export type Resolve = (reference: Reference) => Target | undefined;

/** Finds what a reference points at; the first of several of the same name. */
export function resolver(targets: readonly Target[]): Resolve {
  const byName = new Map<string, Target>();
  for (const target of targets) {
    const key = `${target.kind} ${target.name}`;
    if (!byName.has(key)) byName.set(key, target);
  }
  return ({ kind, name }) => byName.get(`${kind} ${name}`);
}

export type OpenReference = { pageId: string; pageLabel: string; zone: Zone | null; text: string; words: string };

/** What the manual's texts point at that the manual does not have. Designators that no list has are too many to tell. */
export function openReferences(pages: readonly Page[], resolve: Resolve): OpenReference[] {
  const open: OpenReference[] = [];
  const visit = (node: DocNode, { pageId, label }: Page, zone: Zone | null): void => {
    if (isTargetBlock(node)) return;
    const own = (node.attrs?.['zone'] as Zone | null | undefined) ?? zone;
    if (!(node.content ?? []).some(({ type }) => type === 'text'))
      return (node.content ?? []).forEach((child) => visit(child, { pageId, label, document: child }, own));
    const text = textOf(node);
    for (const reference of referencesIn(text)) {
      if (reference.kind === 'part' || resolve(reference) !== undefined) continue;
      const words = text.slice(Math.max(0, reference.from - 40), reference.to + 20).trim();
      open.push({ pageId, pageLabel: label, zone: own, text: `${reference.kind} ${reference.name}`, words });
    }
  };
  for (const page of pages) visit(page.document, page, null);
  return open;
}

/** Where the names of resolved references stand in the text nodes of a document, each with what it leads to. */
export type Leading = { from: number; to: number; target: Target };

export function leadingStretches(document: DocNode, resolve: Resolve): Map<DocNode, Leading[]> {
  const found = new Map<DocNode, Leading[]>();
  const visit = (node: DocNode): void => {
    if (isTargetBlock(node)) return;
    const children = node.content ?? [];
    if (!children.some(({ type }) => type === 'text')) return children.forEach(visit);
    const text = children.map((child) => textOf(child)).join('');
    const leading = referencesIn(text).flatMap(({ from, to, ...reference }) => {
      const target = resolve({ ...reference, from, to });
      return target === undefined ? [] : [{ from, to, target }];
    });
    let start = 0;
    for (const child of children) {
      const end = start + textOf(child).length;
      const inside = leading
        .filter(({ from, to }) => child.type === 'text' && from < end && to > start)
        .map(({ from, to, target }) => ({ from: Math.max(0, from - start), to: Math.min(end, to) - start, target }));
      if (inside.length > 0) found.set(child, inside);
      start = end;
    }
  };
  visit(document);
  return found;
}
