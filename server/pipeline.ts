import type { Pipeline } from '#server/jobs/events.ts';

/** The whole trip of a page. Left: what has happened. Right: the step it queues. */
export const pipeline: Pipeline = {
  'page.added': 'draw-page',
  'page.drawn': 'read-page',
  'words.read': 'structure-page',
  'revision.saved': 'index-page',
  'page.corrected': 'learn-page',
  'lessons.changed': 'teach-manual',
};
