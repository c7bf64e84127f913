/** Short builders, so that a page of content reads like the page. */
import type { Block, DrawingName, HeadingLevel, PartsRow, PartsTableBlock, TableBlock } from './types.ts';

export const head = (text: string): Block => ({ kind: 'head', text });
export const foot = (text: string): Block => ({ kind: 'foot', text });
export const heading = (level: HeadingLevel, text: string): Block => ({ kind: 'heading', level, text });
export const paragraph = (text: string): Block => ({ kind: 'paragraph', text });
export const warning = (text: string): Block => ({ kind: 'warning', text });
export const caution = (text: string): Block => ({ kind: 'caution', text });
export const note = (text: string): Block => ({ kind: 'note', text });
export const figure = (draw: DrawingName, caption: string): Block => ({ kind: 'figure', draw, caption });

/** A marker in brackets, such as (1), is a step below a lettered one. */
export const step = (marker: string, text: string): Block => ({
  kind: 'step',
  marker,
  depth: marker.startsWith('(') ? 2 : 1,
  text,
});

export const table = (
  { caption, ruled }: { readonly caption: string; readonly ruled: boolean },
  headings: readonly string[],
  rows: readonly (readonly string[])[],
): TableBlock => ({
  kind: 'table',
  caption,
  ruled,
  columns: headings.map((text) => ({ heading: text })),
  rows,
});

export const partsTable = (description: Omit<PartsTableBlock, 'kind'>): PartsTableBlock => ({
  kind: 'parts-table',
  ...description,
});

/** One part per line, cells parted by bars; a line without a bar is a section heading. */
export function partsRows(lines: string): PartsRow[] {
  return lines
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '')
    .map((line) => {
      const cells = line.split('|').map((cell) => cell.trim());
      return { kind: cells.length === 1 ? 'section' : 'body', cells };
    });
}
