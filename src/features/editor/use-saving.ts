import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { useMemo } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { canonical } from '#src/blocks/compare/canonical.ts';
import { saveTogether } from '#src/api/revisions.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { toast } from '#src/ui/toast.ts';
import type { SharedText } from './use-shared-text.ts';

/** Longer than any answer of a server that can be reached. */
const longestWaitMs = 5000;

/**
 * Whether the page says something that its newest revision does not, and the making of the next. The text itself is
 * shared as it is typed; a revision is a state of it that readers see and that the history keeps.
 */
export function useSaving(editor: Editor, page: Page, { provider, standing }: SharedText) {
  const post = useMutation(saveTogether(useQueryClient(), page.id));
  const saved = useMemo(() => editor.schema.nodeFromJSON(canonical(page.document)), [editor, page.document]);
  const isDirty = useEditorState({ editor, selector: ({ editor: now }) => !now.state.doc.eq(saved) });
  const save = async (note: string): Promise<boolean> => {
    try {
      await arrived(provider);
      const { number } = await post.mutateAsync(note.trim() === '' ? {} : { note: note.trim() });
      toast(`Saved as revision ${number}.`);
      return true;
    } catch (error) {
      toast.error(saidBy(error));
      return false;
    }
  };
  return { standing, isDirty, isSaving: post.isPending, save };
}

/** Waits until the server has said that it has everything that was typed here. */
function arrived(provider: SharedText['provider']): Promise<void> {
  if (!provider.hasUnsyncedChanges) return Promise.resolve();
  return new Promise((resolve, reject) => {
    const end = (): void => {
      clearTimeout(timer);
      provider.off('unsyncedChanges', look);
    };
    const look = (): void => {
      if (provider.hasUnsyncedChanges) return;
      end();
      resolve();
    };
    const timer = setTimeout(() => {
      end();
      reject(
        new Error('The server cannot be reached. What you typed is kept in this browser and sent when it is back.'),
      );
    }, longestWaitMs);
    provider.on('unsyncedChanges', look);
  });
}
