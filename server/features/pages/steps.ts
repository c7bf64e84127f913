import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import { findSource, sourceKey } from '#server/features/manuals/index.ts';
import type { HeavyStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import type { DrawInput, Drawn, Part } from './draw.ts';
import { type PageRow, changePage, findPage } from './queries.ts';
import { placeToRead, restingState, tellPage } from './service.ts';

export const incomingFile = (tools: Pick<Tools, 'config'>, name: string): string =>
  path.join(tools.config.dataDir, 'incoming', name);

type Kept = Drawn & { drawnKey: string; layerKey: string | null };

const partOf = ({ half, cutShare }: PageRow): Part | null =>
  half === 'whole' ? null : { half, cutShare: cutShare ?? 0.5 };

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
      part: partOf(page),
      target,
      layerTarget: incomingFile(tools, `${page.id}-layer.json`),
      mostMegapixels: tools.config.limits.pictureMegapixels,
    };
  },
  async keep(job, answer) {
    const drawn = answer as Drawn;
    const page = findPage(tools.db, job.subjectId);
    const folder = `pages/${job.subjectId}`;
    // What lies under a key never changes, so each half and each cut has a key of its own.
    const which = page === undefined || page.half === 'whole' ? '' : `-${page.half}-${page.cutShare}`;
    const drawnKey = `${folder}/drawn${which}.jpg`;
    const layerKey = drawn.hasLayer ? `${folder}/layer${which}.json` : null;
    await tools.files.put(drawnKey, incomingFile(tools, `${job.subjectId}-drawn.jpg`));
    if (layerKey !== null) await tools.files.put(layerKey, incomingFile(tools, `${job.subjectId}-layer.json`));
    return { ...drawn, drawnKey, layerKey } satisfies Kept;
  },
  land(connection, job, kept) {
    const { drawnKey, layerKey, width, height, dpi } = kept as Kept;
    const page = findPage(connection, job.subjectId);
    if (page === undefined) return;
    changePage(connection, page.id, {
      drawnKey,
      drawnDpi: dpi,
      layerKey,
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
