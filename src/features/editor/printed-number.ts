import type { Editor } from '@tiptap/core';
import type { Node } from '@tiptap/pm/model';
import type { Zone } from '#shared/document/define-block.ts';
import { around } from '#shared/document/live-values.ts';
import { quantitiesIn } from '#shared/search/quantities-in.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { ParsedQuantity } from '#shared/units/parsed-quantity.ts';

/** A number of the page that can be made live: where it stands, how it is printed, and what was read from it. */
export type PrintedNumber = {
  from: number;
  to: number;
  text: string;
  zone: Zone | null;
  parsed: ParsedQuantity;
  before: string;
};

/** A number, what may be its unit, and a tolerance; the reader of quantities decides how much of it is one. */
const candidate =
  /(?<![\w.])[+-]?(?:\d[\d,]*(?:\.\d+)?|\.\d+)(?:\s?(?:per\s+cent|[A-Za-zµμΩ°%/]+))?(?:\s?±\s?[\d.]+\s?[A-Za-zµ%]*)?/gu;
/** What stands in for a node inside a line of text, so that places stay places. */
const nodeMark = '\uFFFC';

/** The chosen number, or the one that the caret is in or beside; a text says why there is none. */
export function printedNumber(editor: Editor): PrintedNumber | string {
  const { $from, $to, empty } = editor.state.selection;
  if (!$from.parent.isTextblock || !$from.sameParent($to))
    return 'Put the caret into a printed number, or choose one with the mouse or Shift and the arrow keys.';
  const line = lineOf($from.parent);
  const stretch = empty ? numberAround(line, $from.parentOffset) : trimmed(line, $from.parentOffset, $to.parentOffset);
  if (stretch === null) return 'There is no printed number at the caret.';
  return numberIn($from.parent, $from.start(), stretch);
}

const numberedBlocks = new Set(['heading', 'running', 'caption']);

/** Every printed number with a unit that stands on the page as plain text, in its order. */
export function numbersOfPage(doc: Node): PrintedNumber[] {
  const numbers: PrintedNumber[] = [];
  doc.descendants((block, position) => {
    if (!block.isTextblock) return true;
    // "5.3 SECOND I-F" is a heading with a number, no span of time.
    if (numberedBlocks.has(block.type.name)) return false;
    const line = lineOf(block);
    for (const { start } of quantitiesIn(line)) {
      const stretch = numberAround(line, start);
      const number = stretch === null ? null : numberIn(block, position + 1, stretch);
      if (number !== null && typeof number !== 'string') numbers.push(number);
    }
    return false;
  });
  return numbers;
}

const lineOf = (block: Node): string => block.textBetween(0, block.content.size, nodeMark, nodeMark);

/** `start`: where the block's text begins in the document. */
function numberIn(block: Node, start: number, stretch: Stretch): PrintedNumber | string {
  const line = lineOf(block);
  const text = line.slice(stretch.start, stretch.end);
  if (text.includes(nodeMark)) return 'A live value or a line break stands in what is chosen. Choose plain text only.';
  const parsed = parseQuantity(text);
  if (!parsed.ok) return parsed.error.message;
  return {
    from: start + stretch.start,
    to: start + stretch.end,
    text,
    zone: zoneOf(block, stretch),
    parsed: parsed.value,
    before: line.slice(0, stretch.start).replaceAll(nodeMark, ' '),
  };
}

type Stretch = { start: number; end: number };

/** The longest reading around the caret that is a quantity: with its tolerance, with its unit, or the number alone. */
export function numberAround(line: string, caret: number): Stretch | null {
  for (const match of line.matchAll(candidate)) {
    const start = match.index;
    if (caret < start || caret > start + match[0].length) continue;
    const shorter = [match[0], match[0].replace(/\s?±.*$/, ''), match[0].replace(/[^\d.,+-].*$/s, '')];
    const text = shorter
      .map((each) => each.replace(/[.,/]+$/, ''))
      .find((each) => each !== '' && parseQuantity(each).ok);
    if (text !== undefined) return { start, end: start + text.length };
  }
  return null;
}

function trimmed(line: string, from: number, to: number): Stretch | null {
  const chosen = line.slice(from, to);
  const start = from + (chosen.length - chosen.trimStart().length);
  const end = from + chosen.trimEnd().length;
  return end <= start ? null : { start, end };
}

function zoneOf(block: Node, { start, end }: Stretch): Zone | null {
  const zones: Zone[] = [];
  block.nodesBetween(start, end, (node) => {
    const zone = node.marks.find(({ type }) => type.name === 'word')?.attrs['zone'] as Zone | undefined;
    if (zone !== undefined) zones.push(zone);
  });
  return around(zones);
}

/** A printed number and the quantity that it is to show. */
export type Showing = { number: PrintedNumber; quantity: string };

/** Puts several live values in at once, so that one undo takes all of them back. */
export function putLiveValues(editor: Editor, showings: readonly Showing[]): void {
  const chain = editor.chain();
  // From the end of the page on, so that the places before stay true.
  for (const { number, quantity } of showings.toSorted((a, b) => b.number.from - a.number.from))
    chain.insertContentAt(
      { from: number.from, to: number.to },
      { type: 'liveValue', attrs: { quantity, printed: number.text, zone: number.zone } },
      { updateSelection: false },
    );
  chain.run();
}

/** Puts a live value in the place of the printed number. What was printed stays with it. */
export const putLiveValue = (editor: Editor, { from, to, text, zone }: PrintedNumber, quantity: string): boolean =>
  editor
    .chain()
    .focus()
    .insertContentAt(
      { from, to },
      { type: 'liveValue', attrs: { quantity, printed: text, zone } },
      { updateSelection: true },
    )
    .run();
