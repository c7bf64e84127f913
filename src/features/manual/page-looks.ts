import type { PageState } from '#shared/api/pages.ts';
import type { Shape, Tone } from '#src/ui/state-word.tsx';

/** Each state of a page as a word, a shape and an ink. */
export const pageLooks: Record<PageState, { word: string; tone: Tone; shape: Shape }> = {
  waiting: { word: 'waiting', tone: 'pencil', shape: 'ring' },
  reading: { word: 'being read', tone: 'signal', shape: 'half' },
  read: { word: 'read', tone: 'ink', shape: 'dot' },
  failed: { word: 'failed', tone: 'alarm', shape: 'cross' },
  corrected: { word: 'corrected', tone: 'good', shape: 'tick' },
  proofed: { word: 'proofed', tone: 'good', shape: 'double-tick' },
};
