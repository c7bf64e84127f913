import type { PagePresence } from '#shared/api/presence.ts';
import type { LiveEvents } from '#server/jobs/live-events.ts';

type Person = { id: string; name: string };
type Window = Person & { pageId: string; manualId: string };

/** Who has which page open to correct it: one entry for each window, by the name of its connection. */
export type Presence = {
  enter: (connection: string, window: Window) => void;
  leave: (connection: string) => void;
  ofManual: (manualId: string) => PagePresence[];
};

/** Every coming and going is told to the screens that are open. */
export function createPresence(live: Pick<LiveEvents, 'emit'>): Presence {
  const windows = new Map<string, Window>();
  const peopleOn = (pageId: string): Person[] => {
    const people = new Map<string, Person>();
    for (const { id, name, ...window } of windows.values()) if (window.pageId === pageId) people.set(id, { id, name });
    return [...people.values()];
  };
  const tell = ({ manualId, pageId }: Window): void =>
    live.emit({ type: 'presence', manualId, pageId, people: peopleOn(pageId) });
  return {
    enter(connection, window) {
      windows.set(connection, window);
      tell(window);
    },
    leave(connection) {
      const window = windows.get(connection);
      if (window === undefined) return;
      windows.delete(connection);
      tell(window);
    },
    ofManual(manualId) {
      const pageIds = new Set(
        [...windows.values()].filter((each) => each.manualId === manualId).map((each) => each.pageId),
      );
      return [...pageIds].map((pageId) => ({ pageId, people: peopleOn(pageId) }));
    },
  };
}
