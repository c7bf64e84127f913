import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { problemAt, type ExpressionProblem, type Place } from './tree.ts';

/** mathjs's nodes do not say where they stood. Leaves come in the order of the text, so this list of leaves gives the places back. */
export type Leaf = Place & { kind: 'number' | 'name' | 'text'; text: string };

const tokenPatterns: readonly { kind: Leaf['kind'] | 'sign' | 'space'; pattern: RegExp }[] = [
  { kind: 'space', pattern: /[ \t]+/y },
  { kind: 'number', pattern: /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/y },
  { kind: 'name', pattern: /[A-Za-z\u00B5\u03BC\u03A9\u2126][A-Za-z0-9_\u00B5\u03BC\u03A9\u2126]*/y },
  { kind: 'text', pattern: /"[^"\\]*"/y },
  { kind: 'sign', pattern: /<=|>=|==|!=|[-+*/^(),?:<>]/y },
];

const remedies: Readonly<Record<string, string>> = {
  '=': 'One equals sign is no comparison. Write == to compare.',
  '%': 'Write a percentage as a factor: 0.05, not 5%.',
  "'": 'Write names of tables and columns in double quotes.',
  '\u00D7': 'Write * to multiply.',
  '\u00B7': 'Write * to multiply.',
  '\u00F7': 'Write / to divide.',
  '\u2212': 'Write - for minus.',
  '\u2013': 'Write - for minus.',
  '\u00B0': 'Write degC for degrees.',
};

/** mathjs reads these words as operators or constants, which formulas do not have. */
export const parserWords: readonly string[] = [
  'mod',
  'to',
  'in',
  'and',
  'or',
  'xor',
  'not',
  'end',
  'true',
  'false',
  'null',
  'undefined',
  'NaN',
  'Infinity',
];

function wordObjection(word: string): string | undefined {
  if (word === 'in') return 'Write inch for the unit; "in" alone is not understood here.';
  return parserWords.includes(word)
    ? `"${word}" is not part of formulas. Use + - * / ^, a comparison or a function.`
    : undefined;
}

/** Splits a formula and refuses every character that no formula needs, before mathjs sees it. */
export function readLeaves(text: string): Result<Leaf[], ExpressionProblem> {
  const leaves: Leaf[] = [];
  let at = 0;
  while (at < text.length) {
    const token = tokenAt(text, at);
    if (token === undefined) {
      const character = text.charAt(at);
      const remedy =
        remedies[character] ??
        'Formulas are made of numbers, units, names, + - * / ^ ( ), comparisons, ? : and functions.';
      return fail(
        problemAt('not-allowed', { start: at, end: at + 1 }, `"${character}" cannot stand in a formula. ${remedy}`),
      );
    }
    const objection = token.kind === 'name' ? wordObjection(token.text) : undefined;
    if (objection !== undefined)
      return fail(problemAt('not-allowed', { start: at, end: at + token.text.length }, objection));
    if (token.kind !== 'space' && token.kind !== 'sign')
      leaves.push({ kind: token.kind, text: token.text, start: at, end: at + token.text.length });
    at += token.text.length;
  }
  return succeed(leaves);
}

function tokenAt(text: string, at: number): { kind: Leaf['kind'] | 'sign' | 'space'; text: string } | undefined {
  for (const { kind, pattern } of tokenPatterns) {
    pattern.lastIndex = at;
    const found = pattern.exec(text);
    if (found !== null) return { kind, text: found[0] };
  }
  return undefined;
}
