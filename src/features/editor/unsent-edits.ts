import type { HocuspocusProvider } from '@hocuspocus/provider';
import * as Y from 'yjs';
import { readStored, removeStored, writeStored } from '#src/lib/use-stored.ts';
import { toast } from '#src/ui/toast.ts';

/** Soon enough that a crash costs a word, seldom enough that typing is not slowed. */
const keepAfterMs = 700;
const keyOf = (pageId: string): string => `benchleaf.unsent.${pageId}`;
/** Of the edits that were kept: they are this person's own, but not typed now. */
const fromKeeping = 'kept in this browser';

const encode = (bytes: Uint8Array): string => btoa(Array.from(bytes, (each) => String.fromCharCode(each)).join(''));

/** Null where nothing is kept, or what is kept cannot be read any more. */
function readUnsent(pageId: string): Uint8Array | null {
  try {
    const kept = readStored(keyOf(pageId));
    return kept === null ? null : Uint8Array.from(atob(kept), (each) => each.charCodeAt(0));
  } catch {
    return null;
  }
}

/**
 * Keeps in this browser what the server has not said it has, so that neither a lost connection nor a closed window loses
 * a word; and gives it back to the text when the page is next opened. It merges with what others wrote meanwhile.
 * Returns the function that ends the keeping.
 */
export function keepUnsent(pageId: string, provider: HocuspocusProvider): () => void {
  const { document: text } = provider;
  let arrived = Y.encodeStateVector(text);
  let timer: ReturnType<typeof setTimeout> | undefined;
  const keep = (): void => {
    clearTimeout(timer);
    timer = undefined;
    // Before the first answer nothing is known of what the server has.
    if (!provider.isSynced && arrived.length <= 1) return;
    if (provider.hasUnsyncedChanges) writeStored(keyOf(pageId), encode(Y.encodeStateAsUpdate(text, arrived)));
    else {
      arrived = Y.encodeStateVector(text);
      removeStored(keyOf(pageId));
    }
  };
  const later = (): void => {
    timer ??= setTimeout(keep, keepAfterMs);
  };
  const giveBack = (): void => {
    arrived = Y.encodeStateVector(text);
    const kept = readUnsent(pageId);
    if (kept !== null) {
      const before = Y.encodeStateVector(text);
      Y.applyUpdate(text, kept, fromKeeping);
      if (!sameBytes(before, Y.encodeStateVector(text))) toast('What you had typed without a connection was put in.');
    }
    provider.on('unsyncedChanges', later);
    text.on('update', later);
  };
  const onSynced = (): void => {
    provider.off('synced', onSynced);
    giveBack();
  };
  provider.on('synced', onSynced);
  window.addEventListener('pagehide', keep);
  return () => {
    if (timer !== undefined) keep();
    provider.off('unsyncedChanges', later);
    text.off('update', later);
    window.removeEventListener('pagehide', keep);
  };
}

const sameBytes = (one: Uint8Array, other: Uint8Array): boolean =>
  one.length === other.length && one.every((each, index) => each === other[index]);
