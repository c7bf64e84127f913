import type { Editor } from '@tiptap/core';
import { useEffect, useEffectEvent } from 'react';
import type { DocNode } from '#shared/document/define-block.ts';
import { dropDraft, keepDraft } from './draft.ts';

/** Soon enough that a crash costs a word, seldom enough that typing is not slowed. */
const keepAfterMs = 700;

type Given = { editor: Editor; pageId: string; baseRevision: number; isDirty: () => boolean };

/** Keeps what is typed in this browser until it is saved, so that a reload or a crash loses nothing. */
export function useDraft({ editor, pageId, baseRevision, isDirty }: Given): void {
  const keep = useEffectEvent(() => {
    if (editor.isDestroyed) return;
    if (isDirty())
      keepDraft(pageId, { baseRevision, keptAt: new Date().toISOString(), document: editor.getJSON() as DocNode });
    else dropDraft(pageId);
  });
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const now = (): void => {
      if (timer === undefined) return;
      clearTimeout(timer);
      timer = undefined;
      keep();
    };
    const later = (): void => {
      clearTimeout(timer);
      timer = setTimeout(now, keepAfterMs);
    };
    editor.on('update', later);
    window.addEventListener('pagehide', now);
    return () => {
      now();
      editor.off('update', later);
      window.removeEventListener('pagehide', now);
    };
  }, [editor]);
}
