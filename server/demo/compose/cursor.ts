import type { Placed } from './placed.ts';
import { columnWidth, leftEdge, lineHeight, type Pitch, textWidth } from './sheet.ts';
import { wrap } from './wrap.ts';

/** The typist's place on the page: `y` is the base line of the next line. */
export interface Cursor {
  y: number;
  readonly pitch: Pitch;
  readonly placed: Placed[];
}

export interface TextOptions {
  readonly y: number;
  readonly underlined?: boolean;
  /** Letters set apart, as a typist does for a title. */
  readonly spaced?: boolean;
  readonly large?: boolean;
}

/** Large type is this many times as wide as the page's own. */
export const largeScale = 2.2;

export function centred(cursor: Cursor, words: string, options: TextOptions): Placed {
  const text = options.spaced === true ? [...words].join(' ') : words;
  const width = text.length * columnWidth(cursor.pitch) * (options.large === true ? largeScale : 1);
  return {
    kind: 'text',
    x: leftEdge + (textWidth - width) / 2,
    y: options.y,
    text,
    pitch: cursor.pitch,
    underlined: options.underlined === true,
    large: options.large === true,
  };
}

interface Setting {
  readonly indent: number;
  readonly firstIndent?: number;
  readonly rightIndent?: number;
  readonly underlined?: boolean;
}

/** Types a text from the cursor down, indents counted in characters, and leaves the cursor below it. */
export function typeLines(cursor: Cursor, text: string, setting: Setting): void {
  const { indent, firstIndent = 0, rightIndent = 0, underlined = false } = setting;
  const width = columnWidth(cursor.pitch);
  const columns = Math.floor(textWidth / width) - indent - rightIndent;
  // Blanks that no wrap can break stand in for the indent of the first line.
  const lines = wrap(`${'\u00a0'.repeat(firstIndent)}${text}`, columns);
  for (const line of lines) {
    const typed = line.trimStart();
    const x = leftEdge + (indent + line.length - typed.length) * width;
    cursor.placed.push({ kind: 'text', x, y: cursor.y, text: typed, pitch: cursor.pitch, underlined });
    cursor.y += lineHeight;
  }
}
