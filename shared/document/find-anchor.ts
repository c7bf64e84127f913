import { z } from 'zod';
import { type Zone, zone } from './define-block.ts';
import { type FlatBlock, type FlatStretch, type FlatText, piecesIn, zoneOfStretch } from './flat-text.ts';

export const longestQuote = 400;

/**
 * What a comment was made on. It is kept with the comment, never in the page, and found again in the page as it now
 * stands. Without a block and words it is a place on the scan alone.
 */
export const anchor = z
  .object({
    block: z.string().max(64).nullable(),
    /** The words as they stood; '' where it was made on a figure or on a place of the scan. */
    quote: z.string().max(longestQuote),
    /** Where the words began, counted from the beginning of their block: tells the same words twice apart. */
    at: z.number().int().nonnegative().default(0),
    zone: zone.nullable(),
  })
  .refine(({ block, quote, zone: place }) => block !== null || quote.trim() !== '' || place !== null, {
    message: 'A comment needs words, a block or a place on the scan.',
  });
export type Anchor = z.infer<typeof anchor>;

export type FoundAnchor = {
  /** `place`: it never had words. `changed`: the words that it was made on are gone. */
  state: 'found' | 'changed' | 'place';
  /** Where the words now are in the flat text; of the whole block, where only that is left. */
  stretch: FlatStretch | null;
  zone: Zone | null;
};

/** By the block's name and the words in it, then by the words anywhere on the page, then by the place they had. */
export function findAnchor(flat: FlatText, sought: Anchor): FoundAnchor {
  const { quote, zone: place } = sought;
  const block = flat.blocks.find(({ id }) => id === sought.block);
  if (quote.trim() === '') {
    if (block !== undefined) return { state: 'found', stretch: stretchIn(block), zone: block.zone ?? place };
    return { state: sought.block === null ? 'place' : 'changed', stretch: null, zone: place };
  }
  const words = wordsIn(flat, sought, block) ?? wordsAnywhere(flat, sought);
  if (words !== null) return { state: 'found', stretch: words, zone: zoneOfStretch(flat, words) ?? place };
  const stretch = block === undefined ? null : stretchIn(block);
  return { state: 'changed', stretch, zone: place ?? block?.zone ?? null };
}

const stretchIn = ({ from, to }: FlatBlock): FlatStretch | null => (from === to ? null : { from, to });

function wordsIn(flat: FlatText, sought: Anchor, block: FlatBlock | undefined): FlatStretch | null {
  if (block === undefined) return null;
  const inside = occurrences(flat.text.slice(block.from, block.to), sought.quote).map(({ from, to }) => ({
    from: from + block.from,
    to: to + block.from,
  }));
  return nearest(flat, inside, { zone: sought.zone, from: block.from + sought.at });
}

const isLetter = (sign: string | undefined): boolean => sign !== undefined && /[\p{L}\p{N}]/u.test(sign);

/** In other blocks only as whole words: a lone figure stands within many numbers. */
function wordsAnywhere(flat: FlatText, { quote, zone: place, at }: Anchor): FlatStretch | null {
  const { text } = flat;
  const whole = occurrences(text, quote).filter(
    ({ from, to }) =>
      !(isLetter(text[from - 1]) && isLetter(text[from])) && !(isLetter(text[to]) && isLetter(text[to - 1])),
  );
  return nearest(flat, whole, { zone: place, from: at });
}

/** However the spaces and lines between the words have changed. */
function occurrences(text: string, quote: string): FlatStretch[] {
  const words = quote.trim().split(/\s+/);
  const pattern = words.map((each) => each.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')).join('\\s+');
  return [...text.matchAll(new RegExp(pattern, 'gu'))].map((match) => ({
    from: match.index,
    to: match.index + match[0].length,
  }));
}

/** Of several, the one nearest to where it stood on the scan; without places, in the text. */
function nearest(
  flat: FlatText,
  found: readonly FlatStretch[],
  was: { zone: Zone | null; from: number },
): FlatStretch | null {
  let best: FlatStretch | null = null;
  let least: readonly [number, number] = [Infinity, Infinity];
  for (const stretch of found) {
    const place = zoneOfStretch(flat, stretch);
    const onScan = place === null || was.zone === null ? 0 : distance(place, was.zone);
    const away = [onScan, Math.abs(stretch.from - was.from)] as const;
    if (away[0] < least[0] || (away[0] === least[0] && away[1] < least[1])) [best, least] = [stretch, away];
  }
  return best;
}

const distance = ([ax, ay, aw, ah]: Zone, [bx, by, bw, bh]: Zone): number =>
  Math.hypot(ax + aw / 2 - bx - bw / 2, ay + ah / 2 - by - bh / 2);

/** The anchor of some chosen words; of the whole run of text around it, where nothing is chosen. */
export function anchorAt(flat: FlatText, chosen: FlatStretch): Anchor | null {
  const stretch = chosen.from === chosen.to ? runAround(flat, chosen.from) : trimmed(flat, chosen);
  if (stretch === null) return null;
  const first = piecesIn(flat, stretch)[0];
  const block = flat.blocks.find(({ id }) => id === first?.block);
  return {
    block: block?.id ?? null,
    quote: flat.text.slice(stretch.from, Math.min(stretch.to, stretch.from + longestQuote)),
    at: Math.max(0, stretch.from - (block?.from ?? 0)),
    zone: zoneOfStretch(flat, stretch),
  };
}

function runAround(flat: FlatText, at: number): FlatStretch | null {
  const run = piecesIn(flat, { from: at, to: at })[0]?.run;
  const pieces = flat.pieces.filter((piece) => piece.run === run);
  const [first, last] = [pieces[0], pieces.at(-1)];
  return first === undefined || last === undefined ? null : trimmed(flat, { from: first.from, to: last.to });
}

function trimmed({ text }: FlatText, { from, to }: FlatStretch): FlatStretch | null {
  const words = text.slice(from, to);
  if (words.trim() === '') return null;
  return { from: from + words.search(/\S/), to: from + words.trimEnd().length };
}
