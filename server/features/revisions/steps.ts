import { documentOf } from '#shared/reading/structure.ts';
import { changePage, findPage, tellPage } from '#server/features/pages/index.ts';
import type { LightStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import { findReading, findRevision, isTouchedByPeople } from './queries.ts';
import { addRevision, onCurrentPicture } from './service.ts';

/**
 * Makes the page document of a new reading. A page that people have worked on keeps their text: its zones move to the
 * new picture, and the reading is kept beside it.
 */
export const structureStep = (tools: Tools): LightStep => ({
  heavy: false,
  run(job) {
    const { db } = tools;
    const page = findPage(db, job.subjectId);
    const reading = findReading(db, Number(job.wish?.['readingId']));
    if (page === undefined || reading === undefined || page.readingId === reading.id) return;
    const { content, imageKey } = reading;
    const { width, height, confidence } = content;
    const change = { readingId: reading.id, imageKey, width, height, confidence, problem: null };
    const current = page.revision === 0 ? undefined : findRevision(db, page.id, page.revision);
    const isTheirs = isTouchedByPeople(db, page.id);
    changePage(db, page.id, isTheirs ? change : { ...change, state: 'read' });
    const now = { ...page, ...change, ...(isTheirs ? {} : { state: 'read' as const }) };
    const document = isTheirs && current !== undefined ? onCurrentPicture(db, now, current) : documentOf(content);
    const note = isTheirs ? 'Read again: the text is kept, its zones moved to the new picture' : 'Read from the scan';
    addRevision(tools, db, { page: now, who: null, note, document, origin: 'machine' });
    setImmediate(() => tellPage(tools, page.id));
  },
});
