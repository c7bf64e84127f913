import { Link } from 'react-router';
import type { SearchHit } from '#shared/api/search.ts';
import { HitCrop } from './hit-crop.tsx';
import { MarkedText } from './marked-text.tsx';

export const kindWords: Record<SearchHit['kind'], string> = { text: 'text', part: 'parts list', quantity: 'value' };

/** Where a hit is read: its page, with the places lit up; a value that stands on no page is in its manual's list. */
export function addressOfHit({ pageId, manualId, boxes }: SearchHit, q: string): string {
  if (pageId === null) return `/manuals/${manualId}?view=values`;
  const asked = new URLSearchParams();
  if (boxes.length > 0) asked.set('boxes', boxes.map((box) => box.map(Math.round).join(',')).join(';'));
  asked.set('q', q);
  return `/pages/${pageId}/read?${asked.toString()}`;
}

export function Hit({ hit, q }: { hit: SearchHit; q: string }) {
  const { kind, pageId, label, snippet, marks, boxes } = hit;
  return (
    <li className="grid gap-x-6 gap-y-2 py-4 md:grid-cols-[112px_minmax(0,1fr)_minmax(0,1fr)]">
      <div className="flex gap-x-3 md:flex-col">
        <span className="figures font-semibold">{pageId === null ? label : `p. ${label}`}</span>
        <span className="text-pencil">{kindWords[kind]}</span>
      </div>
      <p className="min-w-0">
        <Link
          to={addressOfHit(hit, q)}
          className="font-serif text-lead decoration-signal underline-offset-4 hover:underline"
        >
          <MarkedText text={snippet} marks={marks} />
        </Link>
      </p>
      {pageId === null || boxes.length === 0 ? null : (
        <Link to={addressOfHit(hit, q)} tabIndex={-1} className="block self-start">
          <HitCrop pageId={pageId} boxes={boxes} label={label} />
        </Link>
      )}
    </li>
  );
}
