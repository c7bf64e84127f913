import type { ColumnMeaning } from '#shared/document/blocks/table.ts';

/** What heads of columns say in the trade, as patterns over the heading's letters. Order matters: the first that fits. */
const byHeading: readonly [RegExp, ColumnMeaning][] = [
  [/\b(tol|tolerance)\b/, 'tolerance'],
  [/\b(ref|refer|reference|desig|designation|designator|circuit|symbol|sym)\b/, 'refDes'],
  [/\b(part|stock|cat|catalog|stores|code|spec)\b.*\b(no|num|number)\b|\bpart\b|\bp\/n\b/, 'partNumber'],
  [/\b(qty|quan|quantity|req|reqd|per)\b/, 'quantity'],
  [/\b(desc|description|name|article)\b/, 'description'],
  [/\b(rating|volts|watts|wattage|voltage)\b/, 'rating'],
  [/\b(value|val)\b/, 'value'],
  [/\b(mfr|maker|manufacturer|vendor|supplier)\b/, 'maker'],
  [/\b(chan|channel|ch)\b/, 'channel'],
  [/\b(freq|frequency|mc|kc|mhz|khz|crystal|injection|carrier)\b/, 'frequency'],
  [/\b(remark|remarks|note|notes|use|function)\b/, 'remarks'],
  [/\b(item|no|index)\b/, 'item'],
];

/** Patterns of content; the share of filled cells that must fit is `least`. */
const byContent: readonly { fits: RegExp; least: number; meaning: ColumnMeaning }[] = [
  { fits: /^[A-Z]{1,3}[0-9]{1,4}[A-Z]?([,-] ?[A-Z]{0,3}[0-9]{1,4})*$/, least: 0.6, meaning: 'refDes' },
  { fits: /^\d{2,3}\.\d{2,6}$/, least: 0.6, meaning: 'frequency' },
  { fits: /^\d{1,2}$/, least: 0.7, meaning: 'quantity' },
  { fits: /^(?=.*\d)[A-Z0-9]+([-/][A-Z0-9]+)+$/, least: 0.6, meaning: 'partNumber' },
];

/** What a column means, by its heading where that says it, else by what most of its cells look like. */
export function columnMeaning(heading: string, cells: readonly string[]): ColumnMeaning {
  const words = heading.toLowerCase().replace(/[^a-z/ ]/g, ' ');
  const named = byHeading.find(([pattern]) => pattern.test(words));
  if (named !== undefined) return named[1];
  const filled = cells.filter((cell) => cell !== '');
  const found = byContent.find(
    ({ fits, least }) => filled.length > 0 && filled.filter((cell) => fits.test(cell)).length >= filled.length * least,
  );
  if (found !== undefined) return found.meaning;
  const wordy = filled.filter((cell) => /[a-z]{3}/i.test(cell)).length;
  return filled.length > 0 && wordy > filled.length / 2 ? 'description' : 'other';
}

/** A parts list has reference designators or part numbers; a channel table has channels and frequencies. */
export function tableKind(meanings: readonly ColumnMeaning[]): 'parts' | 'channel' | 'table' {
  const has = (meaning: ColumnMeaning): boolean => meanings.includes(meaning);
  if (has('refDes') && (has('description') || has('partNumber') || has('value'))) return 'parts';
  if (has('partNumber') && has('description')) return 'parts';
  return has('channel') && has('frequency') ? 'channel' : 'table';
}
