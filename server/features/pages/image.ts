import { createHash } from 'node:crypto';
import { access, mkdir, rename } from 'node:fs/promises';
import path from 'node:path';
import type { Response } from 'express';
import sharp from 'sharp';
import { AppError } from '#shared/kit/app-error.ts';
import type { Tools } from '#server/http/tools.ts';
import { moveFile } from '#server/storage/folder-store.ts';
import type { PageRow } from './queries.ts';

type Wanted = { width?: number | undefined; zone?: string | undefined };

/** Widths are rounded up to one of these, so that few sizes of each picture are ever made. */
const widths = [160, 320, 640, 1280, 2560];
const oneYearSeconds = 365 * 24 * 3600;

/** Sends the page image, or one zone of it. The address carries the picture's version, so it can be cached for good. */
export async function sendImage(
  tools: Tools,
  row: PageRow,
  { wanted, response }: { wanted: Wanted; response: Response },
): Promise<void> {
  const key = row.imageKey ?? row.drawnKey;
  if (key === null) throw new AppError('not-found', 'The picture of this page has not been drawn yet.');
  const original = await tools.files.localPath(key);
  const file =
    wanted.width === undefined && wanted.zone === undefined ? original : await cut(tools, { key, original, wanted });
  // The very same bytes under the same address for ever; another reading has another key, and the address says which.
  const maxAge = response.req.query['v'] === undefined ? 0 : oneYearSeconds;
  response.set('Cache-Control', maxAge === 0 ? 'private, no-cache' : `private, max-age=${maxAge}, immutable`);
  await new Promise<void>((resolve, reject) => {
    response.sendFile(file, { cacheControl: false, dotfiles: 'allow' }, (error) => {
      if (error !== undefined && error !== null && !response.headersSent) reject(error);
      else resolve();
    });
  });
}

type Cut = { key: string; original: string; wanted: Wanted };

async function cut(tools: Tools, { key, original, wanted }: Cut): Promise<string> {
  const width =
    wanted.width === undefined ? undefined : (widths.find((each) => each >= (wanted.width ?? 0)) ?? wanted.width);
  const name = createHash('sha256')
    .update(JSON.stringify([key, width, wanted.zone]))
    .digest('hex');
  const file = path.join(tools.config.dataDir, 'cache', name.slice(0, 2), `${name}.jpg`);
  if (
    await access(file).then(
      () => true,
      () => false,
    )
  )
    return file;
  await mkdir(path.dirname(file), { recursive: true });
  const part = `${file}.${process.hrtime.bigint()}.part`;
  let picture = sharp(original);
  if (wanted.zone !== undefined) picture = picture.extract(await areaWithin(original, wanted.zone));
  if (width !== undefined) picture = picture.resize({ width, withoutEnlargement: true });
  await picture.jpeg({ quality: 82 }).toFile(part);
  await rename(part, file).catch(() => moveFile(part, file));
  return file;
}

async function areaWithin(
  original: string,
  zone: string,
): Promise<{ left: number; top: number; width: number; height: number }> {
  const [x = 0, y = 0, w = 0, h = 0] = zone.split(',').map(Number);
  const { width, height } = await sharp(original).metadata();
  const [left, top] = [Math.min(x, width - 1), Math.min(y, height - 1)];
  return { left, top, width: Math.max(1, Math.min(w, width - left)), height: Math.max(1, Math.min(h, height - top)) };
}
