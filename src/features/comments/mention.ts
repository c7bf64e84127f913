import type { PersonName } from '#shared/api/people.ts';

/** An @ that is being written: where it stands, and what follows it up to the caret. */
type Mention = { from: number; query: string };

/** Names have spaces, so more than one word may belong to it; so many letters are enough to choose by. */
const longestQuery = 40;
const mostShown = 6;

export function mentionAt(words: string, caret: number): Mention | null {
  const before = words.slice(Math.max(0, caret - longestQuery - 1), caret);
  const at = before.lastIndexOf('@');
  if (at < 0 || /\n/.test(before.slice(at))) return null;
  // An address such as name@place is no mention.
  if (at > 0 && /[\p{L}\p{N}]/u.test(before[at - 1] ?? '')) return null;
  return { from: caret - (before.length - at), query: before.slice(at + 1) };
}

/** Whose name, or a later word of it, begins with what was written. */
export function peopleFor(query: string, people: readonly PersonName[]): PersonName[] {
  const sought = query.toLowerCase();
  const begins = ({ name }: PersonName): boolean => {
    const words = name.toLowerCase().split(' ');
    return words.some((_word, at) => words.slice(at).join(' ').startsWith(sought));
  };
  return sought.trim() === '' && sought !== '' ? [] : people.filter(begins).slice(0, mostShown);
}

/** The words with the name in place of what was being written, and where the caret then stands. */
export function withMention(
  words: string,
  { from, query }: Mention,
  { name }: PersonName,
): { words: string; caret: number } {
  const after = words.slice(from + 1 + query.length);
  const written = `@${name}${/^\s/.test(after) ? '' : ' '}`;
  return { words: words.slice(0, from) + written + after, caret: from + written.length };
}

export type WordsPart = { text: string; isName: boolean };

/** Words cut at the names in them, so that each name can be set apart. The longest name that fits is taken. */
export function cutAtNames(words: string, people: readonly PersonName[]): WordsPart[] {
  const names = people.map(({ name }) => `@${name}`).sort((a, b) => b.length - a.length);
  const parts: WordsPart[] = [];
  let plain = '';
  for (let at = 0; at < words.length;) {
    const name = names.find((each) => words.startsWith(each, at));
    if (name === undefined) {
      plain += words[at];
      at += 1;
      continue;
    }
    if (plain !== '') parts.push({ text: plain, isName: false });
    parts.push({ text: name, isName: true });
    plain = '';
    at += name.length;
  }
  return plain === '' ? parts : [...parts, { text: plain, isName: false }];
}
