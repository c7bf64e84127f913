import type { InputValues } from '#shared/calc/evaluate.ts';

const keyOf = (manualId: string): string => `benchleaf.setting.${manualId}`;

/** The setting of a manual lives as long as the browser's tab: every page of the manual shows the same one. */
export function readSetting(manualId: string): InputValues {
  try {
    return onlyInputs(JSON.parse(window.sessionStorage.getItem(keyOf(manualId)) ?? '{}'));
  } catch {
    return {};
  }
}

export function writeSetting(manualId: string, inputs: InputValues): void {
  try {
    window.sessionStorage.setItem(keyOf(manualId), JSON.stringify(inputs));
  } catch {
    // Without storage the setting lasts as long as the screen.
  }
}

/** A setting in an address: `channel:16;firstIf:10.7 mc`. */
export const settingInAddress = (inputs: InputValues): string =>
  Object.entries(inputs)
    .map(([symbol, value]) => `${symbol}:${value}`)
    .join(';');

export function settingFromAddress(text: string): InputValues {
  const pairs = text.split(';').flatMap((pair): [string, number | string][] => {
    const [, symbol, value] = /^(\w+):(.+)$/.exec(pair.trim()) ?? [];
    if (symbol === undefined || value === undefined) return [];
    return [[symbol, value.trim() !== '' && Number.isFinite(Number(value)) ? Number(value) : value]];
  });
  return Object.fromEntries(pairs);
}

function onlyInputs(stored: unknown): InputValues {
  if (typeof stored !== 'object' || stored === null) return {};
  return Object.fromEntries(
    Object.entries(stored).filter((entry): entry is [string, number | string] =>
      ['number', 'string'].includes(typeof entry[1]),
    ),
  );
}
