import type { TableColumn } from '#shared/document/blocks/table.ts';
import type { DocNode, Mark } from '#shared/document/define-block.ts';
import type { DoubtMark } from '#shared/document/marks.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { textOf } from '#shared/document/text-of.ts';
import { type Habits, bareWord } from './lessons.ts';
import { foldLookAlikes } from './look-alike.ts';
import { shapeOf } from './shapes.ts';

/** A word that stands on so many corrected pages is one of the manual's own, and no longer a doubt where it reads so. */
const surelyOwn = 2;
/** So many part numbers must be known before one of another shape is odd. */
const fewestPartNumbers = 8;
const mostProposals = 8;

/**
 * What the machine read of a page that nobody has touched yet, in the light of the manual's corrected pages: doubts about
 * the manual's own words are settled, what was corrected elsewhere is doubted with a proposal. Apart from units that the
 * manual is known to write its own way, no text changes.
 */
export function taught(document: PageDocument, habits: Habits): PageDocument {
  const visit = (node: DocNode, inPartNumber: boolean): DocNode => {
    if (node.type === 'text') return taughtText(node, habits, inPartNumber);
    const columns = node.type === 'table' ? (node.attrs?.['columns'] as TableColumn[] | undefined) : undefined;
    if (node.content === undefined) return node;
    return {
      ...node,
      content: columns === undefined ? node.content.map((child) => visit(child, inPartNumber)) : rowsOf(node, columns),
    };
  };
  const rowsOf = (table: DocNode, columns: readonly TableColumn[]): DocNode[] =>
    (table.content ?? []).map((row) => ({
      ...row,
      content: (row.content ?? []).map((cell, at) =>
        visit(cell, row.attrs?.['role'] === 'body' && columns[at]?.meaning === 'partNumber'),
      ),
    }));
  return visit(document, false) as PageDocument;
}

const doubtOf = (node: DocNode): DoubtMark | null =>
  (node.marks?.find(({ type }) => type === 'doubt')?.attrs as DoubtMark | undefined) ?? null;

function withDoubt(node: DocNode, doubt: DoubtMark | null): DocNode {
  const others = (node.marks ?? []).filter(({ type }) => type !== 'doubt');
  const marks: Mark[] = doubt === null ? others : [...others, { type: 'doubt', attrs: doubt }];
  return { ...node, marks };
}

function taughtText(node: DocNode, habits: Habits, inPartNumber: boolean): DocNode {
  const text = textOf(node);
  const doubt = doubtOf(node);
  if (!node.marks?.some(({ type }) => type === 'word') || bareWord(text) === '') return node;
  const own = ownUnit(text, doubt, habits);
  if (own !== null) return withDoubt({ ...node, text: own }, null);
  const raised = doubt === null && inPartNumber && isOdd(text, habits) ? odd : doubt;
  const after = judged(text, raised, habits);
  return after === doubt ? node : withDoubt(node, after);
}

/** The doubt that a word is under once the corrected pages were asked; null for none. */
function judged(text: string, doubt: DoubtMark | null, habits: Habits): DoubtMark | null {
  const word = bareWord(text);
  const isOwn = (habits.vouched.get(word) ?? 0) >= surelyOwn;
  const correction = habits.corrections.get(word);
  if (correction !== undefined && !isOwn) {
    const proposals = [text.replace(word, correction.meant), ...(doubt?.proposals ?? [])];
    return { reason: 'corrected-elsewhere', proposals: few(proposals) };
  }
  if (doubt === null) return null;
  if (doubt.reason === 'low-confidence' && isOwn) return null;
  const alike = (habits.lookAlikes.get(foldLookAlikes(word)) ?? []).filter((each) => each !== word);
  if (alike.length === 0) return doubt;
  return { ...doubt, proposals: few([...alike.map((each) => text.replace(word, each)), ...doubt.proposals]) };
}

const odd: DoubtMark = { reason: 'odd-part-number', proposals: [] };
const few = (proposals: readonly string[]): string[] => [...new Set(proposals)].slice(0, mostProposals);

/** A unit that was made into the usual one, where the manual is known to write it as it was read. */
function ownUnit(text: string, doubt: DoubtMark | null, { ownUnits }: Habits): string | null {
  if (doubt?.reason !== 'sign-guessed') return null;
  const raw = doubt.proposals.find((each) => ownUnits.has(bareWord(each).replace(/^[\d.,±+-]+/, '')));
  return raw === undefined || raw === text ? null : raw;
}

/** Part numbers of a manual keep to a few shapes; one that no corrected page has is worth a look. */
function isOdd(text: string, { partShapes }: Habits): boolean {
  const known = [...partShapes.values()].reduce((sum, count) => sum + count, 0);
  return known >= fewestPartNumbers && !partShapes.has(shapeOf(text));
}
