import { OPS, type PDFPageProxy, type PageViewport, Util } from 'pdfjs-dist/legacy/build/pdf.mjs';
import type { Zone } from '#shared/document/define-block.ts';
import { canonicalLetters } from '#shared/units/definitions.ts';
import type { TextLayer } from '#shared/reading/text-layer.ts';

/** Fewer words are a stamp or a page number, not the text of the page. */
const fewestWords = 5;
/** In heights of the type: a wider gap between two pieces of text is a space, whether or not the file says so. */
const wordGap = 0.18;
/** Text that runs more than this off the level is lettering of a drawing, which the picture is read for. */
const mostSlope = 0.05;
/** Type reaches so far above and below its baseline, in parts of its size: usual for text faces. */
const ascent = 0.78;
const descent = 0.22;

/** The words that a PDF page carries, in pixels of the page as drawn; null where it has none to speak of. */
export async function textLayerOf(page: PDFPageProxy, viewport: PageViewport): Promise<TextLayer | null> {
  const { items } = await page.getTextContent();
  const pieces = items.flatMap((item) => ('str' in item ? (pieceOf(item, viewport) ?? []) : []));
  const words = wordsOf(pieces);
  return words.length < fewestWords ? null : { words, isPainted: await paintsText(page) };
}

type Piece = { text: string; left: number; right: number; baseline: number; size: number };
type Item = { str: string; transform: number[]; width: number; height: number };

function pieceOf({ str, transform, width }: Item, viewport: PageViewport): Piece | null {
  const onPage = Util.transform(viewport.transform, transform) as Matrix;
  const [dx, dy, sx, sy, left, baseline] = onPage;
  if (str === '' || dx <= 0 || Math.abs(dy) > dx * mostSlope) return null;
  return { text: str, left, right: left + width * viewport.scale, baseline, size: Math.hypot(sx, sy) };
}

type Matrix = [number, number, number, number, number, number];

/** Pieces of text into words: a word ends at a space, at a gap and where the line does. */
function wordsOf(pieces: readonly Piece[]): TextLayer['words'] {
  const words: Piece[] = [];
  let mayGoOn = false;
  for (const piece of pieces) {
    const step = (piece.right - piece.left) / piece.text.length;
    for (const { 0: text, index } of piece.text.matchAll(/\S+/g)) {
      const left = piece.left + index * step;
      const word = { ...piece, text, left, right: left + text.length * step };
      const before = words.at(-1);
      if (before !== undefined && mayGoOn && index === 0 && goesOn(before, word))
        words[words.length - 1] = { ...before, text: before.text + text, right: word.right };
      else words.push(word);
    }
    mayGoOn = !/\s$/.test(piece.text);
  }
  return words.map((word) => ({ text: canonicalLetters(word.text.normalize('NFC')), box: boxOf(word) }));
}

const goesOn = (before: Piece, next: Piece): boolean =>
  Math.abs(next.baseline - before.baseline) < next.size * 0.2 &&
  Math.abs(next.left - before.right) < next.size * wordGap;

const boxOf = ({ left, right, baseline, size }: Piece): Zone =>
  [left, baseline - ascent * size, right - left, (ascent + descent) * size].map(Math.round) as Zone;

const invisible = 3;

/** Whether any text is shown: a scan with a reading behind it shows none of it. */
async function paintsText(page: PDFPageProxy): Promise<boolean> {
  const { fnArray, argsArray } = await page.getOperatorList();
  let mode = 0;
  for (const [index, operator] of fnArray.entries()) {
    if (operator === OPS.setTextRenderingMode) mode = Number((argsArray[index] as unknown[])[0]);
    if (operator === OPS.showText && mode !== invisible) return true;
  }
  return false;
}
