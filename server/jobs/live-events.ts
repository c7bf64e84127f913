import { EventEmitter } from 'node:events';
import type { LiveEvent } from '#shared/api/events.ts';

/** Carries what happened to the screens that are open, through the server-sent events route. */
export type LiveEvents = {
  emit: (event: LiveEvent) => void;
  /** Returns the function that ends the subscription. */
  subscribe: (listener: (event: LiveEvent) => void) => () => void;
};

export function createLiveEvents(): LiveEvents {
  const emitter = new EventEmitter();
  emitter.setMaxListeners(0);
  return {
    emit: (event) => void emitter.emit('event', event),
    subscribe(listener) {
      emitter.on('event', listener);
      return () => void emitter.off('event', listener);
    },
  };
}
