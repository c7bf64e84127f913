import type { DocNode } from './define-block.ts';
import { textOf } from './text-of.ts';

/** "5-3", "23" or "iv" on a line of its own, or at the beginning or end of a running head or foot. */
const pageNumber = String.raw`(\d{1,3}-\d{1,3}|\d{1,3}|[ivxl]{1,6})`;
const alone = new RegExp(String.raw`^[\W_]*(?:page\s+)?${pageNumber}[\W_]*$`, 'i');
const atEdge = new RegExp(String.raw`^${pageNumber}(?=\s{1,}\S)|(?<=\S\s+)${pageNumber}$`, 'i');

/** The page number that the page itself prints, in its running feet first and its heads then; null where there is none. */
export function printedPageNumber(document: DocNode): string | null {
  const running = (document.content ?? []).filter(({ type }) => type === 'running');
  const inOrder = [...running.filter(isFoot), ...running.filter((block) => !isFoot(block))];
  const texts = inOrder.map((block) => textOf(block).replace(/\s+/g, ' ').trim());
  for (const pattern of [alone, atEdge])
    for (const text of texts) {
      const found = pattern.exec(text);
      const name = found?.[1] ?? found?.[2];
      if (name !== undefined) return name.toLowerCase();
    }
  return null;
}

const isFoot = ({ attrs }: DocNode): boolean => attrs?.['place'] === 'foot';

type Numbered = { pageId: string; label: string; printed: string | null };
export type PageNumbers = {
  pages: Numbered[];
  /** What is odd about the row of numbers, in words: gaps and doubles. */
  problems: { pageId: string; says: string }[];
};

/** The printed numbers of a manual's pages in their order, and where the row of them breaks. */
export function pageNumbersOf(pages: readonly { pageId: string; label: string; document: DocNode }[]): PageNumbers {
  const numbered = pages.map(({ pageId, label, document }) => ({
    pageId,
    label,
    printed: printedPageNumber(document),
  }));
  const problems: PageNumbers['problems'] = [];
  const firstWith = new Map<string, Numbered>();
  let before: Numbered | undefined;
  for (const page of numbered) {
    const { printed, pageId, label } = page;
    if (printed === null) continue;
    const twin = firstWith.get(printed);
    if (twin !== undefined) problems.push({ pageId, says: `Pages ${twin.label} and ${label} both print ${printed}.` });
    else firstWith.set(printed, page);
    const missing = before === undefined ? 0 : missingBetween(before.printed ?? '', printed);
    if (missing > 0 && before?.printed !== undefined)
      problems.push({
        pageId,
        says: `Between ${before.printed} and ${printed} ${missing === 1 ? 'a page is' : `${missing} pages are`} missing.`,
      });
    before = page;
  }
  return { pages: numbered, problems };
}

/** How many numbers lie between two of the same section; none where a new section begins. */
function missingBetween(before: string, after: string): number {
  const [one, other] = [before, after].map((name) => /^(?:(\d+)-)?(\d+)$/.exec(name));
  if (one === null || other === null || one === undefined || other === undefined || one[1] !== other[1]) return 0;
  return Math.max(0, Number(other[2]) - Number(one[2]) - 1);
}
