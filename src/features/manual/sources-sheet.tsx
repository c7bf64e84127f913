import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Source } from '#shared/api/sources.ts';
import { fileOfSource, sourcesOfManual } from '#src/api/sources.ts';
import { writtenBytes, writtenTime } from '#src/lib/written.ts';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { SectionHead } from '#src/ui/screen.tsx';

const kinds: Record<string, string> = {
  'application/pdf': 'PDF',
  'image/tiff': 'TIFF',
  'image/png': 'PNG',
  'image/jpeg': 'JPEG',
  'image/webp': 'WebP',
};

/** The files as they came, kept byte for byte; each is named by its SHA-256. */
export function SourcesSheet({ manualId, pickFiles }: { manualId: string; pickFiles?: ReactNode }) {
  const { data: sources, error, isPending, refetch } = useQuery(sourcesOfManual(manualId));
  if (isPending) return <Pending what="Fetching the list of files …" lines={3} />;
  if (sources === undefined)
    return <Failure what="The list of files could not be fetched" error={error} onRetry={() => void refetch()} />;
  if (sources.length === 0) {
    return (
      <Empty title="No file has been taken in" action={pickFiles}>
        Files are kept exactly as they come, so that everything made from them can be made again.
      </Empty>
    );
  }
  return (
    <>
      <SectionHead title="Files this manual was taken in from">{pickFiles}</SectionHead>
      <ul className="divide-y divide-rule border-y border-ink">
        {sources.map((source) => (
          <SourceRow key={source.id} source={source} />
        ))}
      </ul>
    </>
  );
}

function SourceRow({ source }: { source: Source }) {
  const { id, fileName, sha256, bytes, mediaType, pageCount, createdAt, problem } = source;
  const facts: [string, string][] = [
    ['Kind', kinds[mediaType] ?? mediaType],
    ['Pages', pageCount === null ? 'not counted' : String(pageCount)],
    ['Size', writtenBytes(bytes)],
    ['Taken in', writtenTime(createdAt)],
  ];
  return (
    <li className="py-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <span className="min-w-0 font-semibold break-all">{fileName}</span>
        <a href={fileOfSource(id)} download={fileName} className="word-link" aria-label={`Download ${fileName}`}>
          Download
        </a>
      </div>
      <dl className="mt-1 flex flex-wrap gap-x-6 gap-y-1">
        {facts.map(([label, value]) => (
          <div key={label} className="flex gap-2">
            <dt className="text-pencil">{label}</dt>
            <dd className="figures">{value}</dd>
          </div>
        ))}
        <div className="flex min-w-0 gap-2">
          <dt className="whitespace-nowrap text-pencil">SHA-256</dt>
          <dd className="figures min-w-0 break-all">{sha256}</dd>
        </div>
      </dl>
      {problem === null || problem === undefined || problem === '' ? null : (
        <p className="mt-1 text-doubt">{problem}</p>
      )}
    </li>
  );
}
