import { z } from 'zod';
import * as zoneApi from '#shared/api/zone-readings.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { type Reading, type ReadingWord, meanConfidence, readingWord } from '#shared/reading/reading.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { existingPage, newestReading } from '#server/features/pages/index.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { WorkerFailure } from '#server/jobs/worker-pool.ts';
import type { ReadZoneInput } from './read-zone.ts';

type ZoneTools = Tools & { sideWorker: SideWorker };

export function recognitionRoutes(api: ApiRouter, tools: ZoneTools): void {
  serve(api, zoneApi.readZone, ({ params, body }) => readZoneOf(tools, params.pageId, body));
}

async function readZoneOf(
  tools: ZoneTools,
  pageId: string,
  { zone, as }: { zone: Zone; as: zoneApi.ZoneKind },
): Promise<zoneApi.ZoneReading> {
  const page = existingPage(tools.db, pageId);
  const reading = newestReading(tools.db, page);
  if (reading === undefined || page.imageKey === null)
    throw new AppError('cannot-do', 'This page has not been read yet. One zone of it can be read once the whole was.');
  const { content } = reading;
  const image = await tools.files.localPath(page.imageKey);
  const input: ReadZoneInput = { image, dpi: content.recipe.dpi, zone: withinPage(zone, content), as };
  const words = await wordsFrom(tools.sideWorker, input);
  const blocks = words.length === 0 ? [] : documentOf({ ...content, words, figures: [] }).content;
  return { words, blocks, confidence: meanConfidence(words) };
}

const smallestPixels = 4;

function withinPage([x, y, w, h]: Zone, { width, height }: Reading): Zone {
  const [left, top] = [Math.max(0, Math.floor(x)), Math.max(0, Math.floor(y))];
  const [right, bottom] = [Math.min(width, Math.ceil(x + w)), Math.min(height, Math.ceil(y + h))];
  if (right - left < smallestPixels || bottom - top < smallestPixels)
    throw new AppError('cannot-do', 'The zone lies outside the page, or is too small to hold a letter.');
  return [left, top, right - left, bottom - top];
}

async function wordsFrom(worker: SideWorker, input: ReadZoneInput): Promise<ReadingWord[]> {
  try {
    return z.array(readingWord).parse(await worker.run('read-zone', input));
  } catch (error) {
    if (error instanceof WorkerFailure)
      throw new AppError('cannot-do', `This zone could not be read. ${error.message}`);
    throw error;
  }
}
