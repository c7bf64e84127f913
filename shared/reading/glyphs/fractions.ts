import type { Zone } from '#shared/document/define-block.ts';
import { glyphIn } from './classify.ts';
import { inkBox } from './patch.ts';
import type { Look, ReadSymbol } from './spelled.ts';

/** A fraction set as one sign, as wide as this in heights of a capital, comes out as one to three figures or odd letters. */
const narrowest = 0.72;
const widest = 1.9;
const bentFraction = /^[0-9VYZvyAIlTxz%$¥/\\|"“”'’)?&]{1,3}$/;
const bentWord = /^[("']?[0-9VYZvyAIlTxz%$¥/\\|"“”'’)?&]{1,5}[).,;:"”-]*$/;
const surelyFraction = 0.8;
const leastOverlap = 0.25;
const fractionSigns = '½¼¾⅛⅜⅝⅞⅓⅔';

/** A word with the fractions in it, which the engine reads as figures: ½ as 34, 1½ as 174. Null where it shows none. */
export function fractionsIn(symbols: readonly ReadSymbol[], look: Look): string | null {
  const text = symbols.map((symbol) => symbol.text).join('');
  if (!bentWord.test(text)) return null;
  let isAnySeen = false;
  const parts = piecesOf(symbols, look).map(({ zone, text: read }) => {
    const width = zone[2] / look.measure.capital;
    if (width < narrowest || width > widest || !bentFraction.test(read)) return read;
    if (!areEntangled(symbols.filter(({ box }) => isOver(box, zone)))) return read;
    const found = glyphIn(look.picture, zone, look.measure);
    if (found === null || found.likelihood < surelyFraction || !fractionSigns.includes(found.glyph)) return read;
    isAnySeen = true;
    return found.glyph;
  });
  return isAnySeen ? parts.join('') : null;
}

const isOver = ([x, , w]: Zone, zone: Zone): boolean => x + w / 2 >= zone[0] - 1 && x + w / 2 <= zone[0] + zone[2] + 1;

/** Figures that merely touch stand side by side; those of a fraction lie one over the other. */
const areEntangled = (symbols: readonly ReadSymbol[]): boolean =>
  symbols.slice(1).every(({ box }, at) => {
    const before = symbols[at]?.box ?? box;
    return before[0] + before[2] - box[0] > Math.min(before[2], box[2]) * leastOverlap;
  });

type Piece = { zone: Zone; text: string };

/** The pieces of ink of a word that stand apart, each with what the engine read there. */
function piecesOf(symbols: readonly ReadSymbol[], look: Look): Piece[] {
  const pieces = inkRuns(symbols, look);
  for (const { text, box } of symbols) {
    const middle = box[0] + box[2] / 2;
    const distance = ({ zone: [x, , w] }: Piece): number => Math.max(0, x - middle, middle - x - w);
    const [nearest] = [...pieces].sort((a, b) => distance(a) - distance(b));
    if (nearest !== undefined) nearest.text += text;
  }
  return pieces.filter(({ text }) => text !== '');
}

function inkRuns(symbols: readonly ReadSymbol[], { picture, measure: { baseline, capital } }: Look): Piece[] {
  const left = Math.min(...symbols.map(({ box }) => box[0])) - 2;
  const right = Math.max(...symbols.map(({ box }) => box[0] + box[2])) + 2;
  const [top, height] = [Math.round(baseline - capital * 1.45), Math.round(capital * 1.9)];
  const pieces: Piece[] = [];
  let from = -1;
  for (let x = left; x <= right; x += 1) {
    const hasInk = x < right && inkBox(picture, [x, top, 1, height]) !== null;
    if (hasInk && from < 0) from = x;
    if (hasInk || from < 0) continue;
    pieces.push({ zone: [from, top, x - from, height], text: '' });
    from = -1;
  }
  return pieces;
}
