import type { Readable } from 'node:stream';

/** Where uploaded files and page images lie. Keys are relative paths with slashes, made by the server, never by a person. */
export type FileStore = {
  /** Moves a finished local file in. A key that exists already is left as it is: content under a key never changes. */
  put: (key: string, localFile: string) => Promise<void>;
  read: (key: string) => Promise<Readable>;
  /** A local path to read from, for libraries that need one. Do not write to it. */
  localPath: (key: string) => Promise<string>;
  remove: (key: string) => Promise<void>;
};
