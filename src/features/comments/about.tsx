import type { Page } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import type { Anchor } from '#shared/document/find-anchor.ts';
import { imageOf } from '#src/api/pages.ts';

const longestShown = 90;

/** A little of what lies around a place, so that a person sees where on the page it is. */
const shownAround = ([x, y, w, h]: Zone): Zone => [Math.max(0, x - 12), Math.max(0, y - 12), w + 24, h + 24];

export const shortQuote = ({ quote }: Anchor): string => {
  const words = quote.replace(/\s+/g, ' ').trim();
  return words.length > longestShown ? `${words.slice(0, longestShown)} …` : words;
};

type Props = { anchor: Anchor; page: Pick<Page, 'id' | 'imageVersion'>; zone: Zone | null };

/** What a comment is about: the words as they stood, or the place of the scan. */
export function About({ anchor, page, zone }: Props) {
  const quote = shortQuote(anchor);
  if (quote !== '') return <q className="thread-quote">{quote}</q>;
  if (zone === null || page.imageVersion === null) return <span className="text-pencil">A place on the scan</span>;
  return (
    <img
      className="max-h-24 max-w-full border border-rule object-contain"
      src={imageOf(page.id, { zone: shownAround(zone), v: page.imageVersion })}
      alt="The place on the scan"
    />
  );
}
