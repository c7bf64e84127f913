/** Text with what no reader can tell apart made the same: quotes, dashes, runs of spaces and dots. */
export const levelled = (text: string): string =>
  text
    .normalize('NFC')
    .replaceAll('\u03bc', 'µ')
    .replaceAll('\u2126', 'Ω')
    .replace(/[’‘]/g, "'")
    .replace(/[“”]/g, '"')
    .replace(/[–—]/g, '-')
    .replace(/\u00ad/g, '')
    .replace(/(?:[.·…_]\s?){4,}/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();

/** The least insertions, deletions and changes of one letter that make one text into the other (Levenshtein 1966). */
export function editDistance(a: string, b: string): number {
  let above = Uint32Array.from({ length: b.length + 1 }, (_, at) => at);
  for (let i = 1; i <= a.length; i += 1) {
    const row = new Uint32Array(b.length + 1);
    row[0] = i;
    for (let j = 1; j <= b.length; j += 1) {
      const changed = (above[j - 1] ?? 0) + (a.charCodeAt(i - 1) === b.charCodeAt(j - 1) ? 0 : 1);
      row[j] = Math.min(changed, (above[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1);
    }
    above = row;
  }
  return above[b.length] ?? 0;
}

/** The share of the true words that are not among those read, whatever their order. */
export function wordBagError(truth: string, read: string): number {
  const words = truth.split(' ');
  return 1 - matched(words, read.split(' ')) / words.length;
}

/** How many of the true things are among those found, as "right/all"; each found one counts once. */
export const shareOf = (truth: readonly string[], found: readonly string[]): string =>
  truth.length === 0 ? '-' : `${matched(truth, found)}/${truth.length}`;

function matched(truth: readonly string[], found: readonly string[]): number {
  const left = new Map<string, number>();
  for (const each of found) left.set(each, (left.get(each) ?? 0) + 1);
  return truth.filter((each) => {
    const count = left.get(each) ?? 0;
    left.set(each, count - 1);
    return count > 0;
  }).length;
}
