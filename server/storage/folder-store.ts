import { createReadStream } from 'node:fs';
import { access, copyFile, mkdir, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import type { FileStore } from './file-store.ts';

/** The default store: a folder. */
export function folderStore(root: string): FileStore {
  const pathOf = (key: string): string => {
    const full = path.resolve(root, key);
    if (!full.startsWith(path.resolve(root) + path.sep)) throw new Error(`The key ${key} leads out of the store.`);
    return full;
  };
  return {
    async put(key, localFile) {
      const target = pathOf(key);
      await mkdir(path.dirname(target), { recursive: true });
      await moveFile(localFile, target);
    },
    read: (key) => Promise.resolve(createReadStream(pathOf(key))),
    localPath: async (key) => {
      await access(pathOf(key));
      return pathOf(key);
    },
    remove: (key) => rm(pathOf(key), { force: true }),
  };
}

/** Rename within one disk is atomic; across disks the copy lands under a passing name first, so no half file is ever seen. */
export async function moveFile(from: string, to: string): Promise<void> {
  try {
    await rename(from, to);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EXDEV') throw error;
    await copyFile(from, `${to}.part`);
    await rename(`${to}.part`, to);
    await rm(from, { force: true });
  }
}
