import { useCallback, useState } from 'react';

/** Browsers may refuse storage altogether (private windows, policies); then a choice lasts as long as the screen. */
export function readStored(key: string): string | null {
  try {
    return window.localStorage.getItem(key);
  } catch {
    return null;
  }
}

export function writeStored(key: string, value: string): void {
  try {
    window.localStorage.setItem(key, value);
  } catch {
    // Nothing to do: the choice is kept in memory by the caller.
  }
}

export function removeStored(key: string): void {
  try {
    window.localStorage.removeItem(key);
  } catch {
    // Without storage there was nothing to remove.
  }
}

/** A choice of this person on this machine, one of a closed list, kept between visits. */
export function useStored<const T extends string>(
  key: string,
  choices: readonly T[],
  first: T,
): [T, (value: T) => void] {
  const [value, setValue] = useState<T>(() => {
    const stored = readStored(key);
    return choices.find((choice) => choice === stored) ?? first;
  });
  const set = useCallback(
    (next: T) => {
      setValue(next);
      writeStored(key, next);
    },
    [key],
  );
  return [value, set];
}
