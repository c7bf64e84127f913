/** Words with what they should have been; those of the truth have their corners, x0, y0, x1, y1. */
export type TrueWord = { t: string; box: readonly number[] };
export type ReadWord = { text: string; conf: number; box: readonly number[] };
/** Which confidence a word had and whether it was right; `hasDigit` by the printed word. */
export type Judged = { confidence: number; isRight: boolean; hasDigit: boolean; raw: ReadWord; wanted: string };

const plain = (text: string): string =>
  text
    .normalize('NFC')
    .replace(/[’‘]/g, "'")
    .replace(/[“”]/g, '"')
    .replace(/[–—]/g, '-')
    .replace(/\u03bc/g, 'µ')
    .replace(/\s+/g, '');

/**
 * Judges each read word against the printed words that lie within it: those whose middle it covers. What covers none is
 * junk, which is counted elsewhere; words of which parts were read apart are compared joined.
 */
export function judged(truth: readonly TrueWord[], read: readonly ReadWord[]): Judged[] {
  const owners = new Map<TrueWord, ReadWord[]>();
  for (const word of read) {
    const best = truth
      .map((each) => ({ each, shared: sharedArea(each.box, word.box) }))
      .reduce<{ each: TrueWord | null; shared: number }>((a, b) => (b.shared > a.shared ? b : a), {
        each: null,
        shared: 0,
      });
    if (best.each !== null) owners.set(best.each, [...(owners.get(best.each) ?? []), word]);
  }
  return [...owners].map(([{ t }, words]) => {
    const text = plain(
      [...words]
        .sort((a, b) => (a.box[0] ?? 0) - (b.box[0] ?? 0))
        .map((word) => word.text)
        .join(''),
    );
    const lowest = words.reduce((a, b) => (b.conf < a.conf ? b : a));
    // A word that was read together with its neighbour holds more than itself, and is right if it holds that.
    const isRight = text === plain(t) || (text.length > t.length && text.includes(plain(t)));
    return { confidence: lowest.conf, isRight, hasDigit: /\d/.test(t), raw: lowest, wanted: t };
  });
}

function sharedArea(
  [a = 0, b = 0, c = 0, d = 0]: readonly number[],
  [e = 0, f = 0, g = 0, h = 0]: readonly number[],
): number {
  const [w, l] = [Math.min(c, g) - Math.max(a, e), Math.min(d, h) - Math.max(b, f)];
  return w > 0 && l > 0 ? w * l : 0;
}

const buckets = [0, 30, 50, 70, 80, 90, 95, 101];

/** Error rates by confidence, how many of the wrong words lie lowest, and how many numbers are wrong in confidence. */
export function confidenceLines(words: readonly Judged[]): string[] {
  const share = (part: number, whole: number): string => (whole === 0 ? '-' : `${((part / whole) * 100).toFixed(2)}%`);
  const wrong = words.filter(({ isRight }) => !isRight).length;
  const byConfidence = [...words].sort((a, b) => a.confidence - b.confidence);
  const wrongAmong = (part: number): number =>
    byConfidence.slice(0, Math.round(words.length * part)).filter(({ isRight }) => !isRight).length;
  const numbers = words.filter(({ hasDigit }) => hasDigit);
  const sure = numbers.filter(({ confidence, isRight }) => confidence >= 90 && !isRight).length;
  return [
    ...buckets.slice(0, -1).map((from, index) => {
      const to = buckets[index + 1] ?? 101;
      const own = words.filter(({ confidence }) => confidence >= from && confidence < to);
      const bad = own.filter(({ isRight }) => !isRight).length;
      return `confidence ${String(from).padStart(3)}-${Math.min(to, 100)}: ${share(own.length, words.length).padStart(7)} of the words, of these wrong ${share(bad, own.length)}`;
    }),
    `${wrong} of ${words.length} words wrong; in the lowest 5 %: ${share(wrongAmong(0.05), wrong)}, in the lowest 10 %: ${share(wrongAmong(0.1), wrong)}`,
    `words with figures wrong at 90 and more: ${sure} of ${numbers.length} (${numbers.length === 0 ? '-' : ((sure / numbers.length) * 1000).toFixed(1)} in a thousand)`,
  ];
}
