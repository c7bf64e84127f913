import { isUnit } from '#shared/units/definitions.ts';
import { findFunction, namedNumbers } from './functions.ts';
import { parserWords } from './tokens.ts';

const symbolPattern = /^[A-Za-z][A-Za-z0-9_]*$/;
/** Why a word cannot name a quantity; undefined where it can. */
export function symbolObjection(name: string): string | undefined {
  if (!symbolPattern.test(name))
    return `"${name}" cannot be a symbol. Use letters, digits and _, beginning with a letter.`;
  if (isUnit(name)) return `"${name}" is a unit. Choose another symbol, like ${name}_1.`;
  if (findFunction(name) !== undefined) return `"${name}" is a function. Choose another symbol.`;
  if (name === 'lookup' || parserWords.includes(name) || namedNumbers.has(name))
    return `"${name}" has a meaning of its own in formulas. Choose another symbol.`;
  return undefined;
}
