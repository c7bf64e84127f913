import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import path from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import multer, { type StorageEngine } from 'multer';

/** A file that has arrived under a passing name. `tooLarge`: it was let run past and not kept. */
export type ArrivedFile = { fileName: string; path: string; sha256: string; bytes: number; tooLarge: boolean };

const mostFilesAtOnce = 200;

declare global {
  /* eslint-disable @typescript-eslint/no-namespace -- multer's own way to let its file be extended */
  namespace Express {
    namespace Multer {
      interface File {
        arrived: ArrivedFile;
      }
    }
  }
}

/** Takes the files of a multipart request to disk as they come, never one whole in memory, hashing on the way. */
export function receiveFiles(incomingDir: string, mostBytes: number) {
  const upload = multer({
    storage: streamingStorage(incomingDir, mostBytes),
    limits: { files: mostFilesAtOnce, fields: 20 },
    defParamCharset: 'utf8',
  }).array('files', mostFilesAtOnce);
  return (request: Request, response: Response): Promise<ArrivedFile[]> =>
    new Promise((resolve, reject) => {
      upload(request, response, (error: unknown) => {
        if (error instanceof Error) reject(error);
        else resolve(((request.files ?? []) as Express.Multer.File[]).map(({ arrived }) => arrived));
      });
    });
}

/** An oversized file does not end the batch: the rest of it is read off and dropped, and the file says so. */
function streamingStorage(incomingDir: string, mostBytes: number): StorageEngine {
  const take = async (file: Express.Multer.File): Promise<ArrivedFile> => {
    await mkdir(incomingDir, { recursive: true });
    const target = path.join(incomingDir, randomUUID());
    const hash = createHash('sha256');
    let bytes = 0;
    const measure = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        bytes += chunk.length;
        if (bytes > mostBytes) return done();
        hash.update(chunk);
        done(null, chunk);
      },
    });
    await pipeline(file.stream, measure, createWriteStream(target));
    const tooLarge = bytes > mostBytes;
    if (tooLarge) await rm(target, { force: true });
    return { fileName: shownName(file.originalname), path: target, sha256: hash.digest('hex'), bytes, tooLarge };
  };
  return {
    _handleFile: (_request, file, done) => {
      take(file).then(
        (arrived) => done(null, { arrived, path: arrived.path }),
        (error: unknown) => done(error),
      );
    },
    _removeFile: (_request, file, done) => {
      rm(file.path, { force: true }).then(() => done(null), done);
    },
  };
}

const longestName = 200;
/** The name is only ever shown: the last part of whatever path was sent, without control characters. */
export const shownName = (sent: string): string =>
  (sent.split(/[\\/]/).pop() ?? '').replace(/[\u0000-\u001f\u007f]/g, '').slice(-longestName) || 'unnamed';
