/** Sets a page of content out on the sheet, as a typist would. */
import type { Block, ManualPage } from '#server/demo/content/types.ts';
import { drawings } from './drawings/drawings.ts';
import { centred, type Cursor, type TextOptions, typeLines } from './cursor.ts';
import { layOutTable } from './layout-table.ts';
import type { Placed } from './placed.ts';
import {
  columnWidth,
  firstLine,
  footLine,
  headLine,
  lastLine,
  leftEdge,
  lineHeight,
  type Pitch,
  textWidth,
} from './sheet.ts';

const hazardIndent = 8;
const stepIndent = 5;
const paragraphGap = 0.6 * lineHeight;
/** Longer words on a cover are a remark, not a title. */
const longestSpacedTitle = 30;
const coverTop = 520;

export function layOut(page: ManualPage, pitch: Pitch): Placed[] {
  const cursor: Cursor = { y: firstLine, pitch, placed: [] };
  const place = page.label === 'Cover' ? placeOnCover : placeBlock;
  if (page.label === 'Cover') cursor.y = coverTop;
  for (const block of page.blocks) place(cursor, block);
  if (cursor.y > lastLine) throw new Error(`Page ${page.label} runs ${cursor.y - lastLine} dots over its foot`);
  return cursor.placed;
}

function placeBlock(cursor: Cursor, block: Block): void {
  switch (block.kind) {
    case 'head':
      cursor.placed.push(centred(cursor, block.text, { y: headLine }));
      return;
    case 'foot':
      cursor.placed.push(centred(cursor, block.text, { y: footLine }));
      return;
    case 'heading':
      return placeHeading(cursor, block.level, block.text);
    case 'paragraph':
      typeLines(cursor, block.text, { indent: 0, firstIndent: stepIndent });
      cursor.y += paragraphGap;
      return;
    case 'step':
      return placeStep(cursor, block);
    case 'warning':
    case 'caution':
    case 'note':
      return placeHazard(cursor, block);
    case 'parts-table':
    case 'table':
      return layOutTable(cursor, block);
    case 'figure':
      return placeFigure(cursor, block);
  }
}

function placeHeading(cursor: Cursor, level: number, text: string): void {
  if (level === 1) {
    cursor.placed.push(centred(cursor, text, { y: cursor.y, underlined: true }));
    cursor.y += 2 * lineHeight;
    return;
  }
  // Room is left above a heading, but not at the top of the page.
  if (cursor.y > firstLine) cursor.y += 0.25 * lineHeight;
  typeLines(cursor, text, { indent: 0, underlined: true });
  cursor.y += 0.5 * lineHeight;
}

function placeStep(cursor: Cursor, { marker, depth, text }: Extract<Block, { kind: 'step' }>): void {
  const indent = depth * stepIndent;
  const x = leftEdge + indent * columnWidth(cursor.pitch);
  cursor.placed.push({ kind: 'text', x, y: cursor.y, text: marker, pitch: cursor.pitch });
  typeLines(cursor, text, { indent: indent + stepIndent });
  cursor.y += 0.35 * lineHeight;
}

function placeHazard(cursor: Cursor, { kind, text }: { kind: 'warning' | 'caution' | 'note'; text: string }): void {
  cursor.y += 0.3 * lineHeight;
  cursor.placed.push(centred(cursor, kind.toUpperCase(), { y: cursor.y, underlined: true }));
  cursor.y += 1.5 * lineHeight;
  typeLines(cursor, text, { indent: hazardIndent, rightIndent: hazardIndent });
  cursor.y += 0.8 * lineHeight;
}

function placeFigure(cursor: Cursor, { draw, caption }: Extract<Block, { kind: 'figure' }>): void {
  const { width, height } = drawings[draw];
  cursor.placed.push({ kind: 'drawing', name: draw, x: leftEdge + (textWidth - width) / 2, y: cursor.y - 20 });
  cursor.y += height + 0.8 * lineHeight;
  cursor.placed.push(centred(cursor, caption, { y: cursor.y }));
  cursor.y += 1.7 * lineHeight;
}

function placeOnCover(cursor: Cursor, block: Block): void {
  switch (block.kind) {
    case 'heading': {
      const options: TextOptions = block.level === 1 ? { y: cursor.y, large: true } : { y: cursor.y, spaced: true };
      cursor.placed.push(centred(cursor, block.text, options));
      cursor.y += block.level === 1 ? 150 : 220;
      return;
    }
    case 'paragraph': {
      if (block.text.length > longestSpacedTitle) return typeLines(cursor, block.text, { indent: 0 });
      cursor.placed.push(centred(cursor, block.text, { y: cursor.y, spaced: true }));
      cursor.y += 170;
      return;
    }
    case 'figure':
      placeFigure(cursor, block);
      cursor.y += 80;
      return;
    case 'table':
      layOutTable(cursor, block);
      cursor.y += 60;
      return;
    default:
      throw new Error(`A cover has no place for a ${block.kind}`);
  }
}
