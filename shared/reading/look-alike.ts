/** Letters that recognition takes for one another; all of a row fold to its first. From counts on generated scans. */
const lookAlikes: readonly string[] = ['0oqd', '1il|!', '5s', '8b', '6g', '2z', 'ce', 'vy', 'uµ'];
const folded = new Map(lookAlikes.flatMap((row) => [...row].map((letter) => [letter, row.charAt(0)] as const)));

/** The word with look-alike letters made one, and m for rn: two words that fold alike may be the same print. */
export const foldLookAlikes = (word: string): string =>
  [...word.toLowerCase().replaceAll('rn', 'm')].map((letter) => folded.get(letter) ?? letter).join('');

/** Whether a word on a page may be what was looked for, bent by recognition: alike, or one slip in each six letters off. */
export function isClose(found: string, wanted: string): boolean {
  const [a, b] = [foldLookAlikes(found), foldLookAlikes(wanted)];
  if (a === b) return true;
  const slips = Math.floor(wanted.length / 6) + (wanted.length >= 4 ? 1 : 0);
  return Math.abs(a.length - b.length) <= slips && editDistance(a, b) <= slips;
}

/** Fewest letters to add, drop or change to make one word the other (Levenshtein, Soviet Physics Doklady 10, 1966). */
export function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, at) => at);
  for (let i = 1; i <= a.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const change = (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      next.push(Math.min(change, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[b.length] ?? 0;
}
