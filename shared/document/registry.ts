import type { BlockDefinition } from './define-block.ts';
import { admonition } from './blocks/admonition.ts';
import { caption } from './blocks/caption.ts';
import { doc } from './blocks/doc.ts';
import { figure } from './blocks/figure.ts';
import { heading } from './blocks/heading.ts';
import { liveValue } from './blocks/live-value.ts';
import { paragraph } from './blocks/paragraph.ts';
import { running } from './blocks/running.ts';
import { step } from './blocks/step.ts';
import { tableCell, tableHeader } from './blocks/table-cell.ts';
import { tableRow } from './blocks/table-row.ts';
import { table } from './blocks/table.ts';
import { hardBreak, text } from './blocks/text.ts';

/** Every kind of node a page document may hold. The editor's schema is made from this list too. */
export const blocks = {
  doc,
  paragraph,
  heading,
  step,
  admonition,
  table,
  tableRow,
  tableCell,
  tableHeader,
  figure,
  caption,
  running,
  liveValue,
  text,
  hardBreak,
} as const satisfies Record<string, BlockDefinition>;

export type BlockKind = keyof typeof blocks;

/** The definition of a kind, or undefined for a kind this version does not know. */
export const blockOf = (kind: string): BlockDefinition | undefined =>
  Object.hasOwn(blocks, kind) ? blocks[kind as BlockKind] : undefined;

/** ProseMirror's content expression for a rule: `(paragraph | step)+`. */
export const contentExpression = ({ content }: BlockDefinition): string | undefined =>
  content === null ? undefined : `(${content.of.join(' | ')})${content.least === 1 ? '+' : '*'}`;
