import type { Zone } from '#shared/document/define-block.ts';
import type { PlacedText } from '#shared/document/text-of.ts';
import { isClose } from '#shared/reading/look-alike.ts';
import { type Term, tokensOf } from './query.ts';

type Token = { folded: string; start: number; end: number; zone: Zone | null };
export type MarkedHits = { snippet: string; marks: [number, number][]; boxes: Zone[]; count: number };

const snippetLength = 180;
const mostBoxes = 60;

/** Finds where the terms stand on a page: a snippet around the first, the stretches to mark in it, and boxes for the scan. */
export function markHits(texts: readonly PlacedText[], terms: readonly Term[], close = false): MarkedHits {
  const { text, tokens } = tokenise(texts);
  const matches = close ? isClose : isSame;
  const hits = terms
    .flatMap((term) => hitsOf(tokens, term, matches))
    .sort((a, b) => (a[0]?.start ?? 0) - (b[0]?.start ?? 0));
  const boxes = hits.flat().flatMap(({ zone }) => (zone === null ? [] : [zone]));
  return { ...snippetAround(text, hits), boxes: unique(boxes).slice(0, mostBoxes), count: hits.length };
}

const isSame = (found: string, wanted: string): boolean => found === wanted;

function tokenise(texts: readonly PlacedText[]): { text: string; tokens: Token[] } {
  let text = '';
  const tokens: Token[] = [];
  for (const each of texts) {
    const start = text.length;
    text += each.text;
    for (const match of each.text.matchAll(/[\p{L}\p{N}µμ]+/gu)) {
      for (const folded of tokensOf(match[0]))
        tokens.push({
          folded,
          start: start + match.index,
          end: start + match.index + match[0].length,
          zone: each.zone,
        });
    }
  }
  return { text, tokens };
}

function hitsOf(
  tokens: readonly Token[],
  { tokens: wanted, prefix }: Term,
  matches: (found: string, wanted: string) => boolean,
): Token[][] {
  const hits: Token[][] = [];
  for (let at = 0; at + wanted.length <= tokens.length; at += 1) {
    const run = tokens.slice(at, at + wanted.length);
    const fits = run.every(({ folded }, index) => {
      const word = wanted[index] ?? '';
      const mayGoOn = prefix && index === wanted.length - 1;
      return matches(folded, word) || (mayGoOn && folded.startsWith(word));
    });
    if (fits) hits.push(run);
  }
  return hits;
}

function snippetAround(text: string, hits: Token[][]): Pick<MarkedHits, 'snippet' | 'marks'> {
  const first = hits[0]?.[0]?.start ?? 0;
  const start = backToSpace(text, Math.max(0, first - snippetLength / 3));
  const end = Math.min(text.length, start + snippetLength);
  const marks = hits
    .map((run): [number, number] => [(run[0]?.start ?? 0) - start, (run.at(-1)?.end ?? 0) - start])
    .filter(([from, to]) => from >= 0 && to <= end - start);
  return { snippet: text.slice(start, end).replace(/[\n\t]/g, ' '), marks };
}

const backToSpace = (text: string, at: number): number => (at === 0 ? 0 : text.lastIndexOf(' ', at) + 1);

const unique = (zones: Zone[]): Zone[] => [...new Map(zones.map((zone) => [zone.join(), zone])).values()];

/** Finds where a quantity stands on a page, by its normal form: `455 kc` and `0.455 MHz` have the same one. */
export function markQuantity(
  texts: readonly PlacedText[],
  occurrences: readonly { start: number; end: number }[],
): MarkedHits {
  const { text, tokens } = tokenise(texts);
  const runs = occurrences.map(({ start, end }) => tokens.filter((token) => token.start >= start && token.end <= end));
  const hits = runs.filter((run) => run.length > 0);
  const boxes = hits.flat().flatMap(({ zone }) => (zone === null ? [] : [zone]));
  return { ...snippetAround(text, hits), boxes: unique(boxes).slice(0, mostBoxes), count: hits.length };
}

/** Whether any of the terms is there at all: the close search gives pages whose letters only happen to be similar. */
export const holdsAll = (texts: readonly PlacedText[], terms: readonly Term[], close: boolean): boolean =>
  terms.every((term) => markHits(texts, [term], close).count > 0);
