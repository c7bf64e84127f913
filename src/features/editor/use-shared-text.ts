import { HocuspocusProvider, HocuspocusProviderWebsocket } from '@hocuspocus/provider';
import { useCallback, useEffect, useState, useSyncExternalStore } from 'react';
import * as Y from 'yjs';
import { coeditingPath } from '#shared/api/presence.ts';
import { keepRoom } from '#shared/document/shared-text.ts';
import { keepUnsent } from './unsent-edits.ts';

/** How the window stands to the page's shared text. `away`: what is typed is kept in this browser until the server is back. */
export type Standing = 'joining' | 'together' | 'away' | 'refused';

export type SharedText = {
  text: Y.Doc;
  provider: HocuspocusProvider;
  standing: Standing;
  /** Its text has come; from then on it can be worked on whatever becomes of the connection. */
  hasText: boolean;
  /** Why the server would not let this window in. */
  refusal: string;
};

/** Tried again after one second, two, four, and then every five. */
const longestWaitMs = 5000;

/** Joins the people who have a page open. */
export function useSharedText(pageId: string): SharedText | null {
  const [joined, setJoined] = useState<Joined | null>(null);
  useEffect(() => {
    const window = join(pageId);
    setJoined(window);
    return () => {
      window.leave();
      setJoined(null);
    };
  }, [pageId]);
  const subscribe = useCallback((told: () => void) => joined?.subscribe(told) ?? (() => undefined), [joined]);
  const state = useSyncExternalStore(subscribe, () => joined?.state ?? null);
  return joined === null || state === null ? null : { text: joined.text, provider: joined.provider, ...state };
}

type State = Pick<SharedText, 'standing' | 'hasText' | 'refusal'>;
type Joined = {
  text: Y.Doc;
  provider: HocuspocusProvider;
  readonly state: State;
  subscribe: (told: () => void) => () => void;
  leave: () => void;
};

function join(pageId: string): Joined {
  const text = new Y.Doc();
  const listeners = new Set<() => void>();
  let state: State = { standing: 'joining', hasText: false, refusal: '' };
  const become = (change: Partial<State>): void => {
    const next = { ...state, ...change };
    if (next.standing === state.standing && next.refusal === state.refusal) return;
    state = next;
    for (const told of listeners) told();
  };
  const socket = new HocuspocusProviderWebsocket({
    url: `${location.protocol === 'https:' ? 'wss' : 'ws'}://${location.host}${coeditingPath}`,
    maxDelay: longestWaitMs,
  });
  const provider = new HocuspocusProvider({
    websocketProvider: socket,
    name: pageId,
    document: text,
    // The session's cookie decides; the library asks for a word all the same.
    token: 'session',
    onSynced: ({ state: isSynced }) => {
      if (isSynced) become({ standing: 'together', hasText: true, refusal: '' });
    },
    onClose: () => {
      if (state.standing === 'together') become({ standing: 'away' });
    },
    onAuthenticationFailed: ({ reason }) => become({ standing: 'refused', refusal: reason }),
  });
  provider.attach();
  keepRoom(text);
  const stopKeeping = keepUnsent(pageId, provider);
  return {
    text,
    provider,
    get state() {
      return state;
    },
    subscribe(told) {
      listeners.add(told);
      return () => void listeners.delete(told);
    },
    leave() {
      stopKeeping();
      provider.destroy();
      socket.destroy();
      text.destroy();
    },
  };
}
