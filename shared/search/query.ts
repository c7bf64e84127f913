/** One thing to look for: a word, the start of one, or words in a row. `tokens` are folded as the index folds them. */
export type Term = { tokens: string[]; prefix: boolean; typed: string };

/** Letters without their accents, in small letters: how the index sees a word. */
export const fold = (text: string): string =>
  text.normalize('NFKD').replace(/\p{M}/gu, '').replaceAll('\u03BC', 'µ').toLowerCase();

const tokenPattern = /[\p{L}\p{N}\p{Co}µ]+/gu;

/** Splits text where the index does: at everything that is neither letter nor digit. */
export const tokensOf = (text: string): string[] => fold(text).match(tokenPattern) ?? [];

/**
 * Reads what a person typed: words that must all occur, "words in a row" in quotes, and word* for the start of one.
 * The last word is taken as a start too, for it may not be finished.
 */
export function parseQuery(typed: string): Term[] {
  const parts = [...typed.matchAll(/"([^"]*)"?|(\S+)/g)];
  return parts.flatMap((part, index) => {
    const [, quoted, word] = part;
    const text = quoted ?? word ?? '';
    const tokens = tokensOf(text);
    if (tokens.length === 0) return [];
    const isLastWord = quoted === undefined && index === parts.length - 1;
    return [{ tokens, prefix: quoted === undefined && (text.endsWith('*') || isLastWord), typed: text }];
  });
}

const quoted = (text: string): string => `"${text.replaceAll('"', '""')}"`;

/** The query in the words of SQLite's FTS5. Everything a person typed stands in quotes, so nothing of it is taken for syntax. */
export const fullTextExpression = (terms: readonly Term[]): string =>
  terms.map(({ tokens, prefix }) => `${quoted(tokens.join(' '))}${prefix ? '*' : ''}`).join(' AND ');

const gramLength = 3;

/**
 * For words that recognition may have bent: all runs of three letters, any of which may match. Null when every word is
 * too short to have one.
 */
export function trigramExpression(terms: readonly Term[]): string | null {
  const perTerm = terms.map(({ tokens }) => tokens.flatMap(gramsOf)).filter((grams) => grams.length > 0);
  if (perTerm.length === 0) return null;
  return perTerm.map((grams) => `(${[...new Set(grams)].map(quoted).join(' OR ')})`).join(' AND ');
}

const gramsOf = (token: string): string[] =>
  Array.from({ length: Math.max(0, token.length - gramLength + 1) }, (_, at) => token.slice(at, at + gramLength));
