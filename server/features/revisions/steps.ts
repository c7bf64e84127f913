import type { PageDocument } from '#shared/document/page-document.ts';
import { counted } from '#shared/kit/counted.ts';
import type { Reading } from '#shared/reading/reading.ts';
import { takeReading } from '#shared/reading/take-reading.ts';
import { type PageRow, changePage, existingPage, findPage, tellPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { LightStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import { type RevisionRow, currentDocument, findReading, findRevision, isTouchedByPeople } from './queries.ts';
import { habitsOfManual, machineDocument } from './learning.ts';
import { moveAnchors } from './move-anchors.ts';
import { addRevision, onCurrentPicture, saveSharedText } from './service.ts';

/**
 * Makes the page document of a new reading. A page that people have worked on keeps what they wrote: only words that
 * nobody touched take what the new reading is surer of, and the rest of its news become proposals.
 */
export const structureStep = (tools: Tools): LightStep => ({
  heavy: false,
  run(job) {
    const { db } = tools;
    const found = findPage(db, job.subjectId);
    const reading = findReading(db, Number(job.wish?.['readingId']));
    if (found === undefined || reading === undefined || found.readingId === reading.id) return;
    // Whoever is writing on the page at this moment has touched it.
    const page = saveSharedText(tools, db, { page: found, note: '' }) === null ? found : existingPage(db, found.id);
    const { content, imageKey } = reading;
    const { width, height, confidence, warnings = [] } = content;
    const change = { readingId: reading.id, imageKey, width, height, confidence, warnings, problem: null };
    const current = page.revision === 0 ? undefined : findRevision(db, page.id, page.revision);
    const isTheirs = isTouchedByPeople(db, page.id);
    moveAnchors(db, page, content.transform);
    changePage(db, page.id, isTheirs ? change : { ...change, state: 'read' });
    const now = { ...page, ...change, ...(isTheirs ? {} : { state: 'read' as const }) };
    const { document, note } =
      isTheirs && current !== undefined
        ? readAgain(db, { before: page.readingId, after: content, current, page: now })
        : { document: machineDocument(content, habitsOfManual(db, page.manualId)), note: 'Read from the scan' };
    addRevision(tools, db, { page: now, who: null, note, document, origin: 'machine' });
    setImmediate(() => tellPage(tools, page.id));
  },
});

type Again = { before: number | null; after: Reading; current: RevisionRow; page: PageRow };

function readAgain(db: Connection, { before, after, current, page }: Again): { document: PageDocument; note: string } {
  const earlier = before === null || current.readingId !== before ? undefined : findReading(db, before);
  if (earlier === undefined)
    return { document: onCurrentPicture(db, page, current), note: 'Read again: the text is kept as it was' };
  const { document, improved, proposed } = takeReading(currentDocument(current), earlier.content, after);
  const note = `Read again: ${counted(improved, 'untouched word')} improved, ${counted(proposed, 'proposal')} beside what people wrote`;
  return { document, note };
}
