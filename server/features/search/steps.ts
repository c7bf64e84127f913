import type { DocNode } from '#shared/document/define-block.ts';
import { allNodes, placedTexts } from '#shared/document/text-of.ts';
import { quantitiesIn } from '#shared/search/quantities-in.ts';
import { findPage } from '#server/features/pages/index.ts';
import { documentOfPage } from '#server/features/revisions/index.ts';
import type { LightStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import { replaceEntries } from './queries.ts';

const textOfPlaced = (node: DocNode) => {
  const placed = placedTexts(node);
  return { placed, body: placed.map(({ text }) => text).join('') };
};

/** Puts the current document of a page into the search index, whole, in place of what was there. */
export const indexStep = ({ db }: Tools): LightStep => ({
  heavy: false,
  run(job) {
    const page = findPage(db, job.subjectId);
    const document = page === undefined ? null : documentOfPage(db, page.id, page.revision);
    if (page === undefined || document === null) return;
    const own = { pageId: page.id, manualId: page.manualId };
    const text = { ...own, kind: 'text' as const, ...textOfPlaced(document) };
    const parts = [...partsRows(document)].map((row) => ({ ...own, kind: 'part' as const, ...textOfPlaced(row) }));
    replaceEntries(db, page.id, {
      entries: [text, ...parts],
      quantities: quantitiesIn(text.body).map((found) => ({ ...own, ...found })),
    });
  },
});

function* partsRows(document: DocNode): Generator<DocNode> {
  for (const node of allNodes(document)) {
    if (node.type !== 'table' || node.attrs?.['kind'] !== 'parts') continue;
    yield* (node.content ?? []).filter(({ attrs }) => (attrs?.['role'] ?? 'body') === 'body');
  }
}
