import type { Source } from '#shared/api/sources.ts';
import { uploadFile } from '#src/api/sources.ts';
import { saidBy } from '#src/lib/said-by.ts';

export type UploadState =
  'waiting' | 'sending' | 'examining' | 'taken' | 'duplicate' | 'refused' | 'failed' | 'stopped';
export type Upload = {
  id: number;
  manualId: string;
  fileName: string;
  bytes: number;
  sentBytes: number;
  state: UploadState;
  /** Why, where it was not taken. */
  note?: string;
};

/** Two at a time: one is examined by the server while the next is under way. */
const mostAtOnce = 2;
const open: readonly UploadState[] = ['waiting', 'sending', 'examining'];
const stateOf = { ready: 'taken', duplicate: 'duplicate', refused: 'refused' } as const satisfies Record<
  Source['state'],
  UploadState
>;

export const isOpen = ({ state }: Upload): boolean => open.includes(state);

/** The files that stand in line to be sent, are under way, or have come to an end that was not yet put away. */
export class UploadLine {
  #uploads: readonly Upload[] = [];
  #listeners = new Set<() => void>();
  #files = new Map<number, File>();
  #stops = new Map<number, AbortController>();
  #lastId = 0;

  constructor(private readonly onTaken: (manualId: string) => void) {}

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };
  readonly snapshot = (): readonly Upload[] => this.#uploads;

  isBusy(): boolean {
    return this.#uploads.some(isOpen);
  }

  add(manualId: string, files: readonly File[]): void {
    const added = files.map((file): Upload => {
      this.#lastId += 1;
      this.#files.set(this.#lastId, file);
      return { id: this.#lastId, manualId, fileName: file.name, bytes: file.size, sentBytes: 0, state: 'waiting' };
    });
    this.#set([...this.#uploads, ...added]);
    this.#pump();
  }

  stop(id: number): void {
    this.#stops.get(id)?.abort();
    this.#change(id, { state: 'stopped' });
    this.#pump();
  }

  tryAgain(id: number): void {
    this.#change(id, { state: 'waiting', sentBytes: 0, note: '' });
    this.#pump();
  }

  /** Takes what has come to an end off the list. */
  putAway(manualId: string): void {
    const gone = this.#uploads.filter((upload) => upload.manualId === manualId && !isOpen(upload));
    for (const { id } of gone) this.#files.delete(id);
    this.#set(this.#uploads.filter((upload) => !gone.includes(upload)));
  }

  #set(uploads: readonly Upload[]): void {
    this.#uploads = uploads;
    for (const listener of this.#listeners) listener();
  }

  #change(id: number, change: Partial<Upload>): void {
    this.#set(this.#uploads.map((upload) => (upload.id === id ? { ...upload, ...change } : upload)));
  }

  #pump(): void {
    const underWay = this.#uploads.filter(({ state }) => state === 'sending' || state === 'examining').length;
    const next = this.#uploads.find(({ state }) => state === 'waiting');
    if (next === undefined || underWay >= mostAtOnce) return;
    void this.#send(next);
    this.#pump();
  }

  async #send({ id, manualId, bytes }: Upload): Promise<void> {
    const file = this.#files.get(id);
    if (file === undefined) return;
    const stop = new AbortController();
    this.#stops.set(id, stop);
    this.#change(id, { state: 'sending' });
    try {
      const onProgress = (sent: number): void => {
        const sentBytes = Math.min(sent, bytes);
        if (!stop.signal.aborted) this.#change(id, { sentBytes, state: sent >= bytes ? 'examining' : 'sending' });
      };
      const source = await uploadFile({ manualId, file, onProgress, signal: stop.signal });
      this.#change(id, { state: stateOf[source.state], sentBytes: bytes, note: source.problem ?? '' });
      if (source.state === 'ready') this.onTaken(manualId);
    } catch (error) {
      if (!stop.signal.aborted) this.#change(id, { state: 'failed', note: saidBy(error) });
    } finally {
      this.#stops.delete(id);
      this.#pump();
    }
  }
}
