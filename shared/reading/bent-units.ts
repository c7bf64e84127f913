import { canonicalLetters, findUnit, unitDefinitions } from '#shared/units/definitions.ts';
import type { Mended } from './mended.ts';

/**
 * What becomes of the letters of units: the English model has no µ and no Ω, and takes the c of kc and mc for an e. Seen
 * on generated scans in typewriter, serif and sans faces; the letter as printed, then what it was read as.
 */
const bentLetters: Record<string, readonly string[]> = {
  µ: ['p', 'u', 'n', 'y', 'w'],
  c: ['e', 'o', '¢'],
  Ω: ['Q', 'QQ', 'Q2'],
};
/** Two µ side by side are also read as one letter. */
const bentPair = ['py', 'wp', 'p', 'y', 'n', 'w'];

/** Spellings that stand behind a number and are no units of their own. */
const furtherSpellings = ['dcw', 'Ω', 'kΩ', 'MΩ'];
const spellings = [
  ...unitDefinitions.flatMap(({ symbol, exact = [], anyCase = [] }) => [symbol, ...exact, ...anyCase]),
  ...furtherSpellings,
].filter((spelling) => spelling.length > 1 || spelling === 'Ω');

/** What a printed unit may have been read as, each with all that it may have been. */
const byBent = new Map<string, Set<string>>();
for (const spelling of new Set(spellings.map(canonicalLetters))) {
  for (const bent of bentFormsOf(spelling)) byBent.set(bent, (byBent.get(bent) ?? new Set()).add(spelling));
}

function bentFormsOf(spelling: string): string[] {
  const pairs = spelling.startsWith('µµ') ? bentPair.map((pair) => pair + spelling.slice(2)) : [];
  const letters = [...spelling].map((letter) => [letter, ...(bentLetters[letter] ?? [])]);
  const forms = letters.reduce<string[]>(
    (starts, choices) => starts.flatMap((start) => choices.map((each) => start + each)),
    [''],
  );
  return [...forms, ...pairs].filter((form) => form !== spelling);
}

/** "step 4 see figure 2" is no time. */
const englishWords = new Set(['see', 'ops']);

/** The unit that a word behind a number must have been, or null where it is one already or cannot be one. */
export function mendUnit(read: string): Mended | null {
  if (findUnit(read).ok || englishWords.has(read)) return null;
  // "Vv": typewriter letters whose small form looks like the large one come out as both.
  const single = /^([VWKC])([vwkc])$/.exec(read);
  if (single !== null && single[1] === single[2]?.toUpperCase()) return { text: single[2] ?? read, sure: true };
  const found = [...(byBent.get(read) ?? [])];
  const best = found.sort((a, b) => periodRank(a) - periodRank(b))[0];
  if (best === undefined) return null;
  return { text: best, sure: new Set(found.map(meaningOf)).size === 1 };
}

const meaningOf = (spelling: string): string => {
  const unit = findUnit(spelling);
  return unit.ok ? unit.value.symbol : spelling;
};
/** The small letters of the time before today's symbols: µf rather than µF. */
const periodRank = (spelling: string): number => (/[A-Z]/.test(spelling) ? 1 : 0);

/** `pf`, `uf` and their kin are units, and also what µf is read as. What they are in a manual that prints µ. */
const readAsMicro: Record<string, string> = {
  pf: 'µf',
  uf: 'µf',
  nf: 'µf',
  uh: 'µh',
  nh: 'µh',
  uv: 'µv',
  ua: 'µa',
  uw: 'µw',
  uuf: 'µµf',
  usec: 'µsec',
};
export const microFor = (read: string): string | undefined => readAsMicro[read];

/** Units that no manual prints, because they are what became of µ: where one stands, the manual prints µ. */
export const betraysMicro = (read: string): boolean => {
  const mended = mendUnit(read);
  return mended !== null && mended.text.includes('µ');
};
