import { useQuery } from '@tanstack/react-query';
import type { Setting } from '#shared/api/quantities.ts';
import type { InputValues } from '#shared/calc/evaluate.ts';
import { settingsOfManual } from '#src/api/quantities.ts';
import type { LiveStore } from './live-store.ts';
import { useLiveStore, useSetting } from './live-values.tsx';

export const isSameSetting = (one: InputValues, other: InputValues): boolean => {
  const symbols = new Set([...Object.keys(one), ...Object.keys(other)]);
  return [...symbols].every((symbol) => String(one[symbol]) === String(other[symbol]));
};

/** `Home`, the name under which it was saved, or the inputs that are away from home. */
export function settingWords(store: LiveStore, setting: InputValues, saved: readonly Setting[] = []): string {
  const away = Object.entries(setting);
  if (away.length === 0) return 'Home';
  const named = saved.find(({ inputs }) => isSameSetting(inputs, setting));
  if (named !== undefined) return named.name;
  return away
    .map(([symbol, value]) => `${labelOf(store, symbol)} ${String(value).trim() === '' ? 'not given' : value}`)
    .join(', ');
}

const labelOf = (store: LiveStore, symbol: string): string =>
  store.quantities.find((each) => each.symbol === symbol)?.label ?? symbol;

/** The present setting in words, for title blocks. */
export function useSettingWords(manualId: string): string {
  const store = useLiveStore();
  const setting = useSetting();
  const { data: saved } = useQuery(settingsOfManual(manualId));
  return store === null ? 'Home' : settingWords(store, setting, saved);
}
