import { createReadStream, createWriteStream } from 'node:fs';
import { access, mkdir, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { DeleteObjectCommand, GetObjectCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';
import type { FileStore } from './file-store.ts';

type Bucket = { bucket: string; endpoint: string | null; region: string };

/**
 * A bucket that speaks the S3 protocol. Credentials come from the SDK's usual places. Libraries that need a local file
 * get one from a folder beside the database, which can be emptied at any time.
 */
export function s3Store({ bucket, endpoint, region }: Bucket, cacheDir: string): FileStore {
  // Checksums as trailers of a chunked body are the SDK's default, and many buckets of other makes refuse them.
  const checksums = { requestChecksumCalculation: 'WHEN_REQUIRED', responseChecksumValidation: 'WHEN_REQUIRED' } as const;
  const client = new S3Client({
    region,
    ...checksums, ...(endpoint === null ? {} : { endpoint, forcePathStyle: true }) });
  const fetchObject = async (key: string): Promise<Readable> => {
    const { Body } = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key }));
    if (Body === undefined) throw new Error(`The bucket holds nothing under ${key}.`);
    return Body as Readable;
  };
  return {
    async put(key, localFile) {
      const { size } = await stat(localFile);
      await client.send(
        new PutObjectCommand({ Bucket: bucket, Key: key, Body: createReadStream(localFile), ContentLength: size }),
      );
      await rm(localFile, { force: true });
    },
    read: fetchObject,
    async localPath(key) {
      const local = path.join(cacheDir, key);
      const isThere = await access(local).then(() => true, () => false);
      if (isThere) return local;
      await mkdir(path.dirname(local), { recursive: true });
      await pipeline(await fetchObject(key), createWriteStream(`${local}.part`));
      await rename(`${local}.part`, local);
      return local;
    },
    async remove(key) {
      await client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key }));
      await rm(path.join(cacheDir, key), { force: true });
    },
  };
}
