import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { z } from 'zod';
import type { Source } from '#shared/api/sources.ts';
import { AppError, type ErrorCode } from '#shared/kit/app-error.ts';
import { sources } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { WorkerFailure } from '#server/jobs/worker-pool.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { findSameBytes, sourceReply } from './queries.ts';
import { existingManual } from './service.ts';
import type { ArrivedFile } from './upload.ts';

/** What examining finds in a file: its kind by its bytes, and how many pages; or why it cannot be taken. */
export const inspection = z.union([
  z.object({ mediaType: z.string(), pageCount: z.number().int().positive() }),
  z.object({ refused: z.string(), code: z.enum(['wrong-kind', 'too-large', 'cannot-do']) }),
]);
type Refusal = { refused: string; code: ErrorCode };

export type AddPages = (connection: Connection, source: typeof sources.$inferSelect, pageCount: number) => void;
type SourceTools = Tools & { sideWorker: SideWorker; addPages: AddPages };
type Who = Pick<SignedIn, 'id' | 'name'>;
type Answer = Source & { code?: ErrorCode };

export const sourceKey = (sha256: string): string => `sources/${sha256.slice(0, 2)}/${sha256}`;

/** Takes in each file by itself: one that is refused does not stop the others. All refused is a 4xx, with every answer in it. */
export async function takeIn(
  tools: SourceTools,
  who: Who,
  { manualId, files }: { manualId: string; files: ArrivedFile[] },
): Promise<Source[]> {
  if (files.length === 0)
    throw new AppError('invalid-input', 'No file came with the request. Send files in the field "files".');
  const answers: Answer[] = [];
  for (const file of files) answers.push(await takeInOne(tools, who, { manualId, file }));
  tools.wake();
  tools.live.emit({ type: 'pages', manualId });
  const items = answers.map(({ code: _code, ...item }) => item);
  const [first] = answers;
  if (first?.code !== undefined && answers.every(({ state }) => state === 'refused')) {
    throw new AppError(first.code, answers.map(({ fileName, problem }) => `${fileName}: ${problem}`).join(' '), {
      items,
    });
  }
  return items;
}

async function takeInOne(
  tools: SourceTools,
  who: Who,
  { manualId, file }: { manualId: string; file: ArrivedFile },
): Promise<Answer> {
  try {
    const found = await examine(tools, file);
    if ('refused' in found) return refusal(tools, { manualId, file, found });
    const same = findSameBytes(tools.db, manualId, file.sha256);
    if (same !== undefined) {
      const problem = `These bytes are in this manual already, as ${same.fileName}.`;
      return { ...sourceReply(same), fileName: file.fileName, state: 'duplicate', problem };
    }
    await tools.files.put(sourceKey(file.sha256), file.path);
    return storeSource(tools, who, { manualId, file, ...found });
  } finally {
    await rm(file.path, { force: true });
  }
}

async function examine(
  { sideWorker, config }: SourceTools,
  file: ArrivedFile,
): Promise<z.infer<typeof inspection> | Refusal> {
  if (file.tooLarge) {
    const most = Math.round(config.limits.uploadBytes / 1024 / 1024);
    return { refused: `This file is larger than the ${most} MB that one file may have.`, code: 'too-large' };
  }
  if (file.bytes === 0) return { refused: 'This file is empty: it has no bytes at all.', code: 'cannot-do' };
  const input = { path: file.path, mostPages: config.limits.pages, mostMegapixels: config.limits.pictureMegapixels };
  try {
    return inspection.parse(await sideWorker.run('inspect', input));
  } catch (error) {
    if (!(error instanceof WorkerFailure)) throw error;
    return { refused: `This file could not be examined. ${error.message}`, code: 'cannot-do' };
  }
}

function refusal(
  { now }: SourceTools,
  { manualId, file, found }: { manualId: string; file: ArrivedFile; found: Refusal },
): Answer {
  const { fileName, sha256, bytes } = file;
  const facts = { id: 'refused', manualId, fileName, sha256, bytes, mediaType: '', pageCount: null };
  return { ...facts, state: 'refused', problem: found.refused, createdAt: now().toISOString(), code: found.code };
}

/** The source, its pages and their first work are one transaction: a crash leaves all of it or none. */
function storeSource(
  { db, now, addPages }: SourceTools,
  who: Who,
  {
    manualId,
    file,
    mediaType,
    pageCount,
  }: { manualId: string; file: ArrivedFile; mediaType: string; pageCount: number },
): Answer {
  const { fileName, sha256, bytes } = file;
  return db.transaction((tx) => {
    const row = tx
      .insert(sources)
      .values({
        id: randomUUID(),
        manualId: existingManual(tx, manualId).id,
        ...{ fileName, sha256, bytes, mediaType, pageCount },
        state: 'ready',
        createdAt: now(),
        createdBy: who.name,
      })
      .returning()
      .get();
    addPages(tx, row, pageCount);
    record(tx, who, {
      did: 'uploaded a source',
      subject: fileName,
      subjectId: row.id,
      details: { manualId, sha256, pageCount },
    });
    return sourceReply(row);
  });
}
