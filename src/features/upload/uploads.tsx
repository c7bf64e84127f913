import { type QueryClient, useQueryClient } from '@tanstack/react-query';
import { createContext, type ReactNode, use, useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { manualKeys } from '#src/api/manuals.ts';
import { pageKeys } from '#src/api/page-keys.ts';
import { sourceKeys } from '#src/api/sources.ts';
import { UploadLine } from './upload-line.ts';

const UploadsContext = createContext<UploadLine | null>(null);

async function sourcesChanged(client: QueryClient, manualId: string): Promise<void> {
  await client.invalidateQueries({ queryKey: sourceKeys.ofManual(manualId) });
  await client.invalidateQueries({ queryKey: pageKeys.ofManual(manualId) });
  await client.invalidateQueries({ queryKey: manualKeys.one(manualId) });
}

/** Keeps uploads going while the person looks at other screens. */
export function UploadsProvider({ children }: { children: ReactNode }) {
  const client = useQueryClient();
  const [line] = useState(() => new UploadLine((manualId) => void sourcesChanged(client, manualId)));
  const isBusy = useSyncExternalStore(line.subscribe, () => line.isBusy());
  useEffect(() => {
    if (!isBusy) return undefined;
    const warn = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isBusy]);
  return <UploadsContext value={line}>{children}</UploadsContext>;
}

export function useUploadLine(): UploadLine {
  const line = use(UploadsContext);
  if (line === null) throw new Error('Uploads are used outside of their provider.');
  return line;
}

export function useUploads(manualId: string) {
  const line = useUploadLine();
  const all = useSyncExternalStore(line.subscribe, line.snapshot);
  const uploads = useMemo(() => all.filter((upload) => upload.manualId === manualId), [all, manualId]);
  return { uploads, line };
}
