import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { useCallback, useMemo, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { revision as revisionShape } from '#shared/api/revisions.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { canonical } from '#src/blocks/compare/canonical.ts';
import { oneRevision, saveDocument } from '#src/api/revisions.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { toast } from '#src/ui/toast.ts';
import { dropDraft } from './draft.ts';
import { keepDoubts } from './settle-doubts.ts';

/** The revision that the text in the editor builds upon. */
export type Base = { revision: number; document: DocNode };
/** A revision that somebody else saved meanwhile. */
export type Theirs = Base & { author: string };

export function useSaving(editor: Editor, page: Page) {
  const client = useQueryClient();
  const put = useMutation(saveDocument(client, page.id));
  const [base, setBase] = useState<Base>(() => ({ revision: page.revision, document: canonical(page.document) }));
  const [theirs, setTheirs] = useState<Theirs | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const saved = useMemo(() => editor.schema.nodeFromJSON(base.document), [editor, base]);
  const isDirty = useEditorState({ editor, selector: ({ editor: now }) => !now.state.doc.eq(saved) });

  /** Puts another text into the editor; its doubts stay doubts. */
  const show = useCallback(
    (document: DocNode) => editor.chain().setMeta(keepDoubts, true).setContent(document, { emitUpdate: true }).run(),
    [editor],
  );
  const save = async (note: string, onto: Base = base): Promise<boolean> => {
    const document = readDocument(editor.getJSON());
    if (!document.ok) {
      setFault(`The page cannot be saved as it stands. ${document.error[0]?.message ?? ''}`);
      return false;
    }
    setFault(null);
    const sent = editor.state.doc;
    try {
      const reply = await put.mutateAsync({
        baseRevision: onto.revision,
        document: document.value,
        ...(note.trim() === '' ? {} : { note: note.trim() }),
      });
      setBase({ revision: reply.number, document: canonical(reply.document) });
      // What was typed while the save was under way is not in it.
      if (editor.state.doc.eq(sent)) dropDraft(page.id);
      toast(`Saved as revision ${reply.number}.`);
      return true;
    } catch (error) {
      const current = conflictOf(error);
      if (current === null) setFault(saidBy(error));
      else setTheirs(current);
      return false;
    }
  };
  return {
    base,
    setBase,
    theirs,
    setTheirs,
    fault,
    isDirty,
    isSaving: put.isPending,
    save,
    show,
    /** Fetches a revision that came meanwhile, to merge it. */
    lookAtTheirs: async (number: number): Promise<void> => {
      const { document, author } = await client.fetchQuery(oneRevision(page.id, number));
      setTheirs({ revision: number, document: canonical(document), author });
    },
    /** What came of two edits is put into the editor and saved on top of theirs. */
    saveMerged: async (merged: DocNode, note: string): Promise<void> => {
      if (theirs === null) return;
      setBase(theirs);
      show(merged);
      if (await save(note, theirs)) setTheirs(null);
    },
  };
}

export type Saving = ReturnType<typeof useSaving>;

/** The server sends the revision that stands there now along with its refusal. */
function conflictOf(error: unknown): Theirs | null {
  if (!(error instanceof AppError) || error.code !== 'revision-conflict') return null;
  const current = revisionShape.safeParse(error.details?.['current']);
  return current.success
    ? { revision: current.data.number, document: canonical(current.data.document), author: current.data.author }
    : null;
}
