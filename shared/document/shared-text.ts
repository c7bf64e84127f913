import { updateYFragment, yXmlFragmentToProseMirrorRootNode } from '@tiptap/y-tiptap';
import * as Y from 'yjs';
import type { Issue } from '#shared/kit/app-error.ts';
import type { Result } from '#shared/kit/result.ts';
import { type PageDocument, readDocument } from './page-document.ts';
import { nodeOf, pageSchema } from './page-schema.ts';
import type { BlockKind } from './registry.ts';
import { currentVersion } from './upgrades.ts';

/** Where the page lies in its shared text. */
export const textField = 'page';

/** The text of a page as several people can write it at once (Yjs), from its document; as one binary state. */
export function stateOf(document: PageDocument): Uint8Array {
  const text = new Y.Doc();
  writeInto(text, document);
  return Y.encodeStateAsUpdate(text);
}

/** A shared text put together from a state and the edits that came after it, in any order and as often as they like. */
export function openText(state: Uint8Array, edits: readonly Uint8Array[] = []): Y.Doc {
  const text = new Y.Doc();
  Y.transact(text, () => {
    for (const update of [state, ...edits]) Y.applyUpdate(text, update);
  });
  return text;
}

/**
 * The page document that a shared text holds, checked like any other. What no page may hold is left out of it, as every
 * editor does with what two edits at once can leave behind, such as a table without rows. `version` is that of the
 * program that wrote the text last; one of an older version is brought up.
 */
export function documentIn(text: Y.Doc, version = currentVersion): Result<PageDocument, Issue[]> {
  const { content } = yXmlFragmentToProseMirrorRootNode(text.getXmlFragment(textField), pageSchema).toJSON() as {
    content?: unknown[];
  };
  return readDocument({ type: 'doc', attrs: { version }, content: content ?? [{ type: 'paragraph' }] });
}

/**
 * What somebody who worked on the state `base` and came to `document` did, as an edit that can be given to a text which
 * went on since: only what differs is in it, so that it merges with what others wrote meanwhile.
 */
export function editTowards(base: Uint8Array, document: PageDocument): Uint8Array {
  const text = openText(base);
  const before = Y.encodeStateVector(text);
  writeInto(text, document);
  return Y.encodeStateAsUpdate(text, before);
}

function writeInto(text: Y.Doc, document: PageDocument): void {
  const page = text.getXmlFragment(textField);
  updateYFragment(text, page, nodeOf(document), { mapping: new Map(), isOMark: new Map() });
  makeRoom(page);
}

/**
 * Gives every empty paragraph, heading or cell below an element the run of text that it will have once somebody writes in
 * it. Otherwise two people who begin at the same time make one each; the two are joined later, and what is written into
 * the second meanwhile is lost.
 */
function makeRoom(element: Y.XmlFragment): void {
  for (const child of element.toArray()) {
    if (!(child instanceof Y.XmlElement)) continue;
    if (pageSchema.nodes[child.nodeName as BlockKind]?.isTextblock !== true) makeRoom(child);
    else if (child.length === 0) child.insert(0, [new Y.XmlText()]);
  }
}

const makingRoom = 'making room';

/** Makes room in whatever is added to a text in this window from now on. */
export function keepRoom(text: Y.Doc): void {
  text.on('afterTransaction', ({ local, changed, origin }: Y.Transaction) => {
    if (!local || origin === makingRoom || changed.size === 0) return;
    text.transact(() => {
      for (const type of changed.keys())
        if (type instanceof Y.XmlFragment && type._item?.deleted !== true) makeRoom(type);
    }, makingRoom);
  });
}
