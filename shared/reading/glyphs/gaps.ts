import type { Zone } from '#shared/document/define-block.ts';
import { glyphIn } from './classify.ts';
import { fractionIn } from './fraction-parts.ts';
import { fractionSigns } from './fractions.ts';
import { inkBox } from './patch.ts';
import type { Look, SpelledWord } from './spelled.ts';

// In heights of a capital: ink between two words that is so large is a sign that the engine passed over.
const leastWidth = 0.3;
const leastHeight = 0.6;
const mostWidth = 2;
const surelySign = 0.9;
/** What the engine passes over and the picture shows is a doubt for a person to look at. */
const passedOverConfidence = 60;

/** What stands between two words of a line: a word of its own, or one with the lone figure behind it. */
export type Passed = { word: SpelledWord; takesNext: boolean };

/** A fraction, or an Ω behind a figure, between two words that the engine passed over; null where there is none. */
export function passedOver(before: SpelledWord, next: SpelledWord, look: Look): Passed | null {
  const { picture, measure } = look;
  const { baseline, capital } = measure;
  const from = before.box[0] + before.box[2] + 1;
  const [top, height] = [Math.round(baseline - capital * 1.3), Math.round(capital * 1.6)];
  const between = inkBox(picture, [from, top, next.box[0] - from - 1, height]);
  if (between === null || between[2] < capital * leastWidth || between[3] < capital * leastHeight) return null;
  const takesNext = /^\d{1,2}$/.test(next.text);
  const end = takesNext ? next.box[0] + next.box[2] : between[0] + between[2];
  const zone: Zone = [between[0], top, end - between[0], height];
  if (zone[2] > capital * mostWidth) return null;
  const text = signIn(zone, { look, read: takesNext ? next.text : '', isBehindFigure: /\d[kKM]?$/.test(before.text) });
  if (text === null) return null;
  const box = inkBox(picture, zone) ?? zone;
  const raw = takesNext ? next.raw : text;
  return {
    word: { ...before, text: raw, raw, seen: text, confidence: passedOverConfidence, box, symbols: [] },
    takesNext,
  };
}

function signIn(
  zone: Zone,
  { look, read, isBehindFigure }: { look: Look; read: string; isBehindFigure: boolean },
): string | null {
  const fraction = fractionIn(look.picture, zone, { read, isTall: true });
  if (fraction !== null) return fraction;
  const seen = glyphIn(look.picture, zone, look.measure);
  if (seen === null || seen.likelihood < surelySign) return null;
  const isWanted = fractionSigns.includes(seen.glyph) || (seen.glyph === 'Ω' && isBehindFigure && read === '');
  return isWanted ? seen.glyph : null;
}
