import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { commentsOfPage } from '#src/api/comments.ts';
import type { PageNote } from '#src/scan/use-page-notes.ts';

const longestLabel = 60;

/** The comments of a page as notes for its leaves and its spine. */
export function useNotesOfPage(pageId: string): readonly PageNote[] {
  const { data: threads } = useQuery(commentsOfPage(pageId));
  return useMemo(
    () =>
      (threads ?? []).map(({ id, kind, anchor, words, resolved, isDeleted }) => {
        const said = isDeleted ? 'replies' : words.replace(/\s+/g, ' ').slice(0, longestLabel);
        return {
          id,
          anchor,
          isOpen: resolved === null,
          label: `${kind === 'question' ? 'Question' : 'Note'}: ${said}`,
        };
      }),
    [threads],
  );
}
