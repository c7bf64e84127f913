import type { DocNode } from './define-block.ts';

/** What a block of a page is called when two states of the page are held against each other: its lasting name, else its place. */
export const keyOfBlock = ({ attrs }: DocNode, at: number): string =>
  typeof attrs?.['id'] === 'string' ? attrs['id'] : `at-${at}`;
