import type { Zone } from '#shared/document/define-block.ts';
import { fractionIn } from './fraction-parts.ts';
import { inkBox } from './patch.ts';
import type { Look, ReadSymbol } from './spelled.ts';

/** A fraction set as one sign, as wide as this in heights of a capital, comes out as one to three figures or odd letters. */
const narrowest = 0.72;
const widest = 2.6;
const bentFraction = /^[0-9VYZvyAIlTxz%$¥/\\|"“”'’)?&]{1,3}$/;
const bentWord = /^[("']?[0-9VYZvyAIlTxz%$¥/\\|"“”'’)?&]{1,5}[).,;:"”-]*$/;

/** A word with the fractions in it, which the engine reads as figures: ½ as 34, 1½ as 174. Null where it shows none. */
export function fractionsIn(symbols: readonly ReadSymbol[], look: Look): string | null {
  const text = symbols.map((symbol) => symbol.text).join('');
  if (!bentWord.test(text)) return null;
  let isAnySeen = false;
  const parts = piecesOf(symbols, look).map(({ zone, text: read }) => {
    const width = zone[2] / look.measure.capital;
    if (width < narrowest || width > widest || !bentFraction.test(read)) return read;
    const found = fractionIn(look.picture, zone, { read, isTall: isTall(zone, look) });
    isAnySeen ||= found !== null;
    return found ?? read;
  });
  return isAnySeen ? parts.join('') : null;
}

/** Higher than a capital: the stroke of a fraction often is, and touching figures are not. */
function isTall(zone: Zone, { picture, measure }: Look): boolean {
  const box = inkBox(picture, zone);
  return box !== null && box[3] > measure.capital * 1.1;
}

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
