import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import * as api from '#shared/api/sources.ts';
import type { Source } from '#shared/api/sources.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { addressOf, call, refusal, unreachable } from './call.ts';
import { everyItem } from './every-item.ts';
import { sourceKeys } from './source-keys.ts';

export { sourceKeys } from './source-keys.ts';

export const sourcesOfManual = (manualId: string) =>
  queryOptions({
    queryKey: sourceKeys.ofManual(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listSources, { params: { manualId }, query, signal })),
  });

export const fileOfSource = (sourceId: string): string => addressOf(api.downloadSource, { params: { sourceId } });

type Upload = {
  manualId: string;
  file: File;
  onProgress: (sentBytes: number) => void;
  signal: AbortSignal;
};

/** Sends one file and tells how far it has come, which `fetch` cannot. Answers for the file, also when it was refused. */
export function uploadFile({ manualId, file, onProgress, signal }: Upload): Promise<Source> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const stop = (): void => request.abort();
    signal.addEventListener('abort', stop, { once: true });
    request.upload.addEventListener('progress', ({ loaded }) => onProgress(loaded));
    request.addEventListener('error', () => reject(unreachable()));
    request.addEventListener('abort', () => reject(new DOMException('The upload was stopped.', 'AbortError')));
    request.addEventListener('loadend', () => signal.removeEventListener('abort', stop));
    request.addEventListener('load', () => {
      try {
        resolve(answerFor(request.status, request.responseText));
      } catch (error) {
        reject(error instanceof Error ? error : new Error(String(error)));
      }
    });
    request.open('POST', addressOf(api.uploadSources, { params: { manualId } }));
    const form = new FormData();
    form.append(api.uploadSources.filesField ?? 'files', file);
    request.send(form);
  });
}

const answers = z.object({ items: z.array(api.source).min(1) });

/** When every file of a request is refused, the problem details carry the same list as a good reply does. */
export function answerFor(status: number, text: string): Source {
  if (status >= 200 && status < 300) return firstOf(answers.parse(JSON.parse(text)).items);
  const error = refusal(status, text);
  const refusedItems = answers.safeParse(error instanceof AppError ? error.details : undefined);
  if (refusedItems.success) return firstOf(refusedItems.data.items);
  throw error;
}

function firstOf(items: Source[]): Source {
  const [first] = items;
  if (first === undefined)
    throw new Error('The server did not say what became of the file. Look at the list of sources.');
  return first;
}
