import { useQuery } from '@tanstack/react-query';
import { createContext, type ReactNode, useCallback, useContext, useMemo, useState, useSyncExternalStore } from 'react';
import { flushSync } from 'react-dom';
import type { Quantity } from '#shared/api/quantities.ts';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import type { InputValues } from '#shared/calc/evaluate.ts';
import { channelTablesOfManual, planOfManual } from '#src/api/calculations.ts';
import { quantitiesOfManual } from '#src/api/quantities.ts';
import { useStored } from '#src/lib/use-stored.ts';
import { createLiveStore, type LiveStore } from './live-store.ts';
import { createRedraws } from './redraws.ts';
import { readSetting, settingFromAddress, writeSetting } from './setting-storage.ts';

export const valueViews = ['both', 'set', 'printed'] as const;
export type ValueView = (typeof valueViews)[number];
export const valueViewWords: Record<ValueView, string> = { both: 'Both', set: 'As set', printed: 'As printed' };

/** Values that are set are written as the manual writes its units, or in SI. What was printed always stands as printed. */
export const unitStyles = ['print', 'si'] as const;
export type UnitStyle = (typeof unitStyles)[number];
export const unitStyleWords: Record<UnitStyle, string> = { print: 'Its own units', si: 'SI' };

type Shared = {
  store: LiveStore | null;
  view: ValueView;
  setView: (view: ValueView) => void;
  units: UnitStyle;
  setUnits: (units: UnitStyle) => void;
};
const plainly = { view: 'both', setView: () => undefined, units: 'print', setUnits: () => undefined } as const;
const SharedValues = createContext<Shared>({ store: null, ...plainly });

/** The values of one manual for everything inside. The setting is kept for the tab; an address may bring one (`?setting=channel:16`). */
export function LiveValues({ manualId, children }: { manualId: string; children: ReactNode }) {
  const { data } = useQuery(quantitiesOfManual(manualId));
  const { data: tables } = useQuery(channelTablesOfManual(manualId));
  const { data: stored } = useQuery(planOfManual(manualId));
  const [view, setView] = useStored('benchleaf.values', valueViews, 'both');
  const [units, setUnits] = useStored('benchleaf.units', unitStyles, 'print');
  useState(() => takeFromAddress(manualId));
  const store = useMemo(() => {
    if (data === undefined || tables === undefined || stored === undefined) return null;
    const inputs = readSetting(manualId);
    return createLiveStore({
      manualId,
      quantities: data,
      tables,
      plan: stored.plan,
      inputs,
      onChange: (setting) => writeSetting(manualId, setting),
      redraws: createRedraws({ drawNow: flushSync }),
    });
  }, [manualId, data, tables, stored]);
  const shared = useMemo(() => ({ store, view, setView, units, setUnits }), [store, view, setView, units, setUnits]);
  return <SharedValues.Provider value={shared}>{children}</SharedValues.Provider>;
}

/** A setting in the address counts once, when the screen opens; from then on it is what the person makes of it. */
function takeFromAddress(manualId: string): void {
  const brought = new URLSearchParams(window.location.search).get('setting');
  if (brought !== null) writeSetting(manualId, settingFromAddress(brought));
}

/** For tests and for places that have a store already. */
export function LiveValuesOf({
  store,
  view = 'both',
  children,
}: {
  store: LiveStore;
  view?: ValueView;
  children: ReactNode;
}) {
  const shared = useMemo(() => ({ ...plainly, store, view }), [store, view]);
  return <SharedValues.Provider value={shared}>{children}</SharedValues.Provider>;
}

/** Null until the quantities of the manual are here. */
export const useLiveStore = (): LiveStore | null => useContext(SharedValues).store;

export function useValueView(): [ValueView, (view: ValueView) => void] {
  const { view, setView } = useContext(SharedValues);
  return [view, setView];
}

export function useUnitStyle(): [UnitStyle, (units: UnitStyle) => void] {
  const { units, setUnits } = useContext(SharedValues);
  return [units, setUnits];
}

const silent = () => () => undefined;

/** The value of a symbol at the present setting; drawn again only when it changes. */
export function useValue(symbol: string | undefined): LiveValue | undefined {
  const store = useLiveStore();
  return useSyncExternalStore(store?.subscribe ?? silent, () =>
    symbol === undefined ? undefined : store?.read(symbol),
  );
}

export type LiveQuantity = { quantity: Quantity; value: LiveValue; store: LiveStore };

/** The quantity with this id and its value now; null where the manual has no such quantity, undefined while not yet known. */
export function useLiveValue(quantityId: string): LiveQuantity | null | undefined {
  const store = useLiveStore();
  const quantity = store?.quantity(quantityId);
  const symbol = quantity?.symbol;
  const follow = useCallback(
    (told: () => void) => (symbol === undefined ? silent() : (store?.follow(symbol, told) ?? silent())),
    [store, symbol],
  );
  const value = useSyncExternalStore(follow, () => (symbol === undefined ? undefined : store?.read(symbol)));
  if (store === null) return undefined;
  return quantity === undefined || value === undefined ? null : { quantity, value, store };
}

const atHome: InputValues = {};
/** The inputs that are away from home. */
export function useSetting(): InputValues {
  const store = useLiveStore();
  return useSyncExternalStore(store?.subscribe ?? silent, () => store?.setting() ?? atHome);
}
