import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import { readings } from '#server/db/schema/index.ts';
import { changePage, failPage, findPage, incomingFile, restingState, tellPage } from '#server/features/pages/index.ts';
import type { HeavyStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import { recipeWish, type Reading } from '#shared/reading/reading.ts';
import type { ReadInput } from './read.ts';

type Kept = { reading: Reading; imageKey: string };

/** Reads a drawn page. The reading and the next step land together, so a page is never read into two documents. */
export const readStep = (tools: Tools): HeavyStep => ({
  heavy: true,
  task: 'read',
  began(job) {
    const page = findPage(tools.db, job.subjectId);
    if (page === undefined) return;
    if (page.state !== 'corrected' && page.state !== 'proofed') changePage(tools.db, page.id, { state: 'reading' });
    tellPage(tools, page.id);
  },
  async prepare(job): Promise<ReadInput | null> {
    const page = findPage(tools.db, job.subjectId);
    if (page?.drawnKey === undefined || page.drawnKey === null) return null;
    const target = incomingFile(tools, `${page.id}-read.jpg`);
    await mkdir(path.dirname(target), { recursive: true });
    const wish = recipeWish.catch({}).parse(job.wish ?? {});
    const drawn = await tools.files.localPath(page.drawnKey);
    const layer = page.layerKey === null ? null : await tools.files.localPath(page.layerKey);
    return { drawn, dpi: page.drawnDpi ?? 300, target, wish, layer };
  },
  async keep(job, answer): Promise<Kept> {
    // Another reading may straighten the page otherwise, so each has a picture of its own.
    const imageKey = `pages/${job.subjectId}/read-${tools.now().getTime().toString(36)}.jpg`;
    await tools.files.put(imageKey, incomingFile(tools, `${job.subjectId}-read.jpg`));
    return { reading: answer as Reading, imageKey };
  },
  land(connection, job, kept) {
    const { reading, imageKey } = kept as Kept;
    const page = findPage(connection, job.subjectId);
    if (page === undefined) return;
    const row = connection
      .insert(readings)
      .values({ pageId: page.id, imageKey, content: reading, createdAt: tools.now() })
      .returning()
      .get();
    tools.announce(connection, 'words.read', {
      subjectId: page.id,
      manualId: page.manualId,
      priority: job.priority,
      wish: { readingId: row.id },
    });
  },
  failed: failPage,
  settled(job) {
    const page = findPage(tools.db, job.subjectId);
    if (page?.state === 'reading')
      changePage(tools.db, page.id, { state: restingState({ ...page, state: 'waiting' }) });
    tellPage(tools, job.subjectId);
  },
});
