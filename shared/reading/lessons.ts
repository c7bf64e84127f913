import { z } from 'zod';
import type { TableColumn } from '#shared/document/blocks/table.ts';
import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { allNodes, textOf } from '#shared/document/text-of.ts';
import { foldLookAlikes } from './look-alike.ts';
import type { Reading } from './reading.ts';
import { shapeOf } from './shapes.ts';
import { documentOf } from './structure.ts';

/** What one corrected page teaches about the manual it is of. */
export const lessons = z.object({
  /** Words that stand on the page without a doubt, each once: a person has seen the page. */
  words: z.array(z.string()),
  /** What recognition had read, and what a person made of it. */
  corrections: z.array(z.object({ read: z.string(), meant: z.string(), times: z.number().int() })),
  /** Shapes of the part numbers, with figures as 9 and letters as A. */
  partShapes: z.array(z.string()),
});
export type Lessons = z.infer<typeof lessons>;

/** The word without the punctuation around it, which belongs to the sentence. */
export const bareWord = (text: string): string => text.replace(/^[("'“‘]+|[)"'”’.,;:]+$/g, '');

/** Shorter ones are too easily another word, and plain numbers are never vouched for by standing elsewhere. */
const isTelling = (word: string): boolean => word.length >= 3 && /\p{L}/u.test(word) && !/\s/.test(word);

export function lessonsOf(document: DocNode, reading: Reading | null): Lessons {
  const read = reading === null ? new Map<string, string>() : placedWords(documentOf(reading));
  const words = new Set<string>();
  const corrections = new Map<string, Lessons['corrections'][number]>();
  for (const node of allNodes(document)) {
    if (node.type !== 'text' || hasDoubt(node)) continue;
    for (const word of textOf(node).split(/\s+/).map(bareWord)) if (isTelling(word)) words.add(word);
    const made = correctionOf(node, read);
    if (made === null) continue;
    const key = `${made.read}\n${made.meant}`;
    corrections.set(key, { ...made, times: (corrections.get(key)?.times ?? 0) + 1 });
  }
  return { words: [...words], corrections: [...corrections.values()], partShapes: partShapesOf(document) };
}

/** One word that was made into one other; a changed division into words teaches nothing. */
function correctionOf(node: DocNode, readAt: ReadonlyMap<string, string>): { read: string; meant: string } | null {
  const zone = zoneOf(node);
  const read = bareWord((zone === null ? undefined : readAt.get(zone.join())) ?? '');
  const meant = bareWord(textOf(node));
  return read === meant || meant === '' || !isTelling(read) || /\s/.test(meant) ? null : { read, meant };
}

const placedWords = (document: DocNode): Map<string, string> =>
  new Map(
    [...allNodes(document)].flatMap((node) => {
      const zone = zoneOf(node);
      return zone === null ? [] : [[zone.join(), textOf(node)] as const];
    }),
  );

const zoneOf = (node: DocNode): Zone | null =>
  (node.marks?.find(({ type }) => type === 'word')?.attrs?.['zone'] as Zone | undefined) ?? null;
const hasDoubt = (node: DocNode): boolean => node.marks?.some(({ type }) => type === 'doubt') ?? false;

function partShapesOf(document: DocNode): string[] {
  const shapes: string[] = [];
  for (const { table, columns } of partsTables(document)) {
    for (const row of table.content ?? []) {
      if (row.attrs?.['role'] !== 'body') continue;
      row.content?.forEach((cell, at) => {
        const text = textOf(cell).trim();
        const isSettled = ![...allNodes(cell)].some(hasDoubt);
        if (columns[at]?.meaning === 'partNumber' && text !== '' && isSettled) shapes.push(shapeOf(text));
      });
    }
  }
  return shapes;
}

function* partsTables(document: DocNode): Generator<{ table: DocNode; columns: readonly TableColumn[] }> {
  for (const node of allNodes(document))
    if (node.type === 'table' && node.attrs?.['kind'] === 'parts')
      yield { table: node, columns: (node.attrs['columns'] ?? []) as TableColumn[] };
}

/** What a manual's corrected pages together say about its habits. */
export type Habits = {
  /** On how many corrected pages a word stands. */
  vouched: ReadonlyMap<string, number>;
  /** Vouched words by what look-alike letters make of them. */
  lookAlikes: ReadonlyMap<string, readonly string[]>;
  corrections: ReadonlyMap<string, { meant: string; times: number }>;
  partShapes: ReadonlyMap<string, number>;
  ownUnits: ReadonlySet<string>;
};

export function habitsFrom(pages: readonly Lessons[], ownUnits: readonly string[]): Habits {
  const vouched = tally(pages.flatMap(({ words }) => words));
  const corrections = new Map<string, { meant: string; times: number }>();
  for (const { read, meant, times } of pages.flatMap((page) => page.corrections)) {
    const known = corrections.get(read);
    const total = times + (known?.meant === meant ? known.times : 0);
    if (known === undefined || total > known.times) corrections.set(read, { meant, times: total });
  }
  const lookAlikes = new Map<string, string[]>();
  for (const word of vouched.keys()) {
    const folded = foldLookAlikes(word);
    lookAlikes.set(folded, [...(lookAlikes.get(folded) ?? []), word]);
  }
  const partShapes = tally(pages.flatMap((page) => page.partShapes));
  return { vouched, lookAlikes, corrections, partShapes, ownUnits: new Set(ownUnits) };
}

function tally(items: readonly string[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const item of items) counts.set(item, (counts.get(item) ?? 0) + 1);
  return counts;
}
