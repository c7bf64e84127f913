import { type Line, lineText } from './lines.ts';

/** What a line of print starts or is; `text` goes on with whatever came before. */
export type LineKind =
  | { kind: 'admonition-word'; word: 'warning' | 'caution' | 'note' }
  | { kind: 'heading'; level: 1 | 2 | 3 }
  | { kind: 'step'; marker: string; markerWords: number; depth: number }
  | { kind: 'caption'; of: 'figure' | 'table' }
  | { kind: 'text' };

const spaced = (word: string): string => [...word].join('\\s*');
const admonition = new RegExp(`^\\W*(${['WARNING', 'CAUTION', 'NOTE'].map(spaced).join('|')})\\W*$`, 'i');
const captionStart = /^(fig(?:ure|\.)?|table)\s*[0-9]+[-–.0-9A-Z]*[.:)]?\b/i;
const chapter = /^(section|chapter|part|appendix)\s+([IVXLC]+|\d+|[A-Z])\b/i;
const numbered = /^(\d+(?:[-–.]\d+)+)[.,]?$/;
/** "a." "(3)" "12." "b)" - one or two letters or digits with a closing sign, as steps are marked. */
const marker = /^\(?([a-z]{1,2}|[A-Z]|\d{1,2})[.)]$/;
/** How recognition bends a lone small letter with its stop: "Cc." for "c.", "c," or "¢." for "c.". */
const bentMarker = /^(\(?)([A-Z])?([a-z])([.,)])$/;
const longestHeadingWords = 9;

/** Says what a line is by its words alone; its place on the page is for the caller to judge. */
export function classifyLine(line: Line): LineKind {
  const text = lineText(line);
  const word = admonition.exec(text)?.[1]?.replace(/\s/g, '').toLowerCase();
  if (word !== undefined && line.words.length <= 8)
    return { kind: 'admonition-word', word: word as 'warning' | 'caution' | 'note' };
  if (captionStart.test(text)) return { kind: 'caption', of: /^t/i.test(text) ? 'table' : 'figure' };
  if (chapter.test(text) && line.words.length <= longestHeadingWords) return { kind: 'heading', level: 1 };
  return headingOrStep(line, text);
}

function headingOrStep({ words }: Line, text: string): LineKind {
  const first = straightened(words[0]?.text ?? '');
  const rest = words
    .slice(1)
    .map((each) => each.text)
    .join(' ');
  const isMarked = marker.test(first);
  if (isStep(first, rest)) {
    return { kind: 'step', marker: first, markerWords: 1, depth: first.startsWith('(') ? 1 : 0 };
  }
  const isShort = words.length <= longestHeadingWords;
  const isHeading = isShort && (numbered.test(first) ? isCapitals(rest) : isCapitals(text) && /[A-Z]{3}/.test(text));
  return isHeading ? { kind: 'heading', level: isMarked ? 3 : 2 } : { kind: 'text' };
}

const isStep = (first: string, rest: string): boolean =>
  rest !== '' && (first === '•' || (marker.test(first) && !isCapitals(rest)));

function straightened(printed: string): string {
  const word = printed.replace(/[¢©]/, 'c');
  const [, open = '', capital, letter = '', close = ''] = bentMarker.exec(word) ?? [];
  if (letter === '' || (capital !== undefined && capital.toLowerCase() !== letter)) return word;
  return `${open}${letter}${close === ',' ? '.' : close}`;
}

/** All capitals, digits and signs, with at least one word of them. */
const isCapitals = (text: string): boolean =>
  /[A-Z]{2}/.test(text) && !/[a-z]/.test(text.replace(/\b(mc|kc|cps|ma|mfd|uuf)\b/g, ''));
