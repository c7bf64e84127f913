import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import { findSource, sourceKey } from '#server/features/manuals/index.ts';
import type { HeavyStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import type { DrawInput, Drawn } from './draw.ts';
import { changePage, findPage } from './queries.ts';
import { placeToRead, restingState, tellPage } from './service.ts';

export const incomingFile = (tools: Pick<Tools, 'config'>, name: string): string =>
  path.join(tools.config.dataDir, 'incoming', name);

/** Draws the picture of a page from its source. Runs as often as need be: the picture is simply drawn over. */
export const drawStep = (tools: Tools): HeavyStep => ({
  heavy: true,
  task: 'draw',
  began: () => undefined,
  async prepare(job): Promise<DrawInput | null> {
    const page = findPage(tools.db, job.subjectId);
    const source = page === undefined ? undefined : findSource(tools.db, page.sourceId);
    if (page === undefined || source === undefined) return null;
    const target = incomingFile(tools, `${page.id}-drawn.jpg`);
    await mkdir(path.dirname(target), { recursive: true });
    return {
      path: await tools.files.localPath(sourceKey(source.sha256)),
      mediaType: source.mediaType,
      sourcePage: page.sourcePage,
      target,
      mostMegapixels: tools.config.limits.pictureMegapixels,
    };
  },
  async keep(job, answer) {
    const drawnKey = `pages/${job.subjectId}/drawn.jpg`;
    await tools.files.put(drawnKey, incomingFile(tools, `${job.subjectId}-drawn.jpg`));
    return { ...(answer as Drawn), drawnKey };
  },
  land(connection, job, kept) {
    const { drawnKey, width, height, dpi } = kept as Drawn & { drawnKey: string };
    const page = findPage(connection, job.subjectId);
    if (page === undefined) return;
    changePage(connection, page.id, {
      drawnKey,
      drawnDpi: dpi,
      problem: null,
      ...(page.imageKey === null ? { width, height } : {}),
    });
    tools.announce(connection, 'page.drawn', {
      subjectId: page.id,
      manualId: page.manualId,
      place: placeToRead(page.position),
      priority: job.priority,
    });
  },
  failed: failPage,
  settled: (job) => tellPage(tools, job.subjectId),
});

/** Says on the page why it could not be read. A page that people have worked on keeps its state; the reason shows beside it. */
export const failPage: HeavyStep['failed'] = (connection, job, problem) => {
  const page = findPage(connection, job.subjectId);
  if (page === undefined) return;
  changePage(connection, page.id, { problem, state: page.revision > 0 ? restingState(page) : 'failed' });
};
