import type { HocuspocusProvider } from '@hocuspocus/provider';
import { useEffect, useState } from 'react';

/** The names of the other people who have this page open, each once. */
export function useOthers(provider: HocuspocusProvider): readonly string[] {
  const [others, setOthers] = useState<readonly string[]>([]);
  useEffect(() => {
    const look = (): void => {
      const names = namesIn(provider);
      setOthers((before) => (before.join('\n') === names.join('\n') ? before : names));
    };
    look();
    provider.on('awarenessChange', look);
    return () => {
      provider.off('awarenessChange', look);
    };
  }, [provider]);
  return others;
}

function namesIn({ awareness }: HocuspocusProvider): string[] {
  const states = [...(awareness?.getStates() ?? new Map<number, Record<string, unknown>>())];
  const names = states
    .filter(([client]) => client !== awareness?.clientID)
    .map(([, state]) => (state['user'] as { name?: unknown } | undefined)?.name)
    .filter((name): name is string => typeof name === 'string');
  return [...new Set(names)].sort();
}
