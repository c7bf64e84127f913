import { create, parseDependencies } from 'mathjs/number';
import type { MathNode } from 'mathjs';
import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { convertNode, type Conversion } from './convert-node.ts';
import { readLeaves } from './tokens.ts';
import { childrenOf, problemAt, type Expression, type ExpressionNode, type ExpressionProblem } from './tree.ts';

/** The types share one declaration with the full package, where every entry may be missing. */
const parserParts = parseDependencies as NonNullable<typeof parseDependencies>;
/** Only the parser is built, from mathjs's numbers-only half: about 40 kB of the client bundle instead of 190 (gzip, measured). */
const { parse } = create(parserParts) as unknown as { parse: (text: string) => MathNode };

/** A formula longer than this is a mistake; the parser recurses, so depth is bounded as well. */
const longestExpression = 2000;
const deepestNesting = 60;

/** Reads a formula. Whether its names and units fit is checked later, by checkDimensions. */
export function parseExpression(text: string): Result<Expression, ExpressionProblem> {
  const whole = { start: 0, end: text.length };
  if (text.trim() === '')
    return fail(problemAt('syntax', { start: 0, end: 0 }, 'The formula is empty. Write one, like injection / 9.'));
  if (text.length > longestExpression || nestingOf(text) > deepestNesting) {
    return fail(
      problemAt(
        'too-long',
        whole,
        `The formula is too long or too deep. Split it: up to ${longestExpression} characters and ${deepestNesting} brackets deep.`,
      ),
    );
  }
  const leaves = readLeaves(text);
  if (!leaves.ok) return leaves;
  const parsed = parseText(text);
  if (!parsed.ok) return parsed;
  const conversion: Conversion = { text, leaves: leaves.value, next: 0 };
  const root = convertNode(parsed.value, conversion);
  if (!root.ok) return root;
  return succeed({ text, root: root.value, symbols: symbolsOf(root.value) });
}

/** Brackets open at once, plus every ^ and ? of the text and every sign upon a sign: an upper bound of how deep the parser goes. */
function nestingOf(text: string): number {
  let [open, deepest] = [0, 0];
  for (const character of text) {
    if (character === '(') open += 1;
    if (character === ')') open -= 1;
    deepest = Math.max(deepest, open);
  }
  return deepest + (text.match(/[\^?]|[-+](?=\s*[-+])/g)?.length ?? 0);
}

function parseText(text: string): Result<MathNode, ExpressionProblem> {
  try {
    // mathjs counts only the Greek mu as a letter. One character for one keeps the places.
    return succeed(parse(text.replaceAll('\u00B5', '\u03BC').replaceAll('\u2126', '\u03A9')));
  } catch (error) {
    const { char = 1, message } = error as { char?: number; message: string };
    const start = Math.min(Math.max(0, char - 1), text.length);
    const reason = message.replace(/\s*\(char \d+\)$/, '');
    return fail(
      problemAt('syntax', { start, end: Math.min(start + 1, text.length) }, `The formula breaks off here: ${reason}.`),
    );
  }
}

function symbolsOf(root: ExpressionNode): string[] {
  const names = new Set<string>();
  const visit = (node: ExpressionNode): void => {
    if (node.kind === 'symbol') names.add(node.name);
    childrenOf(node).forEach(visit);
  };
  visit(root);
  return [...names];
}
