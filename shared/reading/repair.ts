import { betraysMicro, mendUnit, microFor } from './bent-units.ts';
import { mendSign, printsTolerances } from './bent-signs.ts';
import { mendDesignator } from './designators.ts';
import { type Mended, type Near, type PageHabit, applied } from './mended.ts';
import type { ReadingWord } from './reading.ts';

/** Mends what cannot have been printed, by the grammar of units; `raw` keeps what the engine wrote. */
export function repairWords(read: readonly ReadingWord[]): ReadingWord[] {
  const words = withoutStrayQuotes(read);
  const habit = habitOf(words);
  const mended: ReadingWord[] = [];
  words.forEach((word, index) => {
    const near = { before: mended[index - 1], next: words[index + 1] };
    mended.push(applied(word, withPicture(word, near, habit)));
  });
  return mended;
}

/** `(470`, `.01`, `3/4`: what a number before its unit looks like, with a bracket or a sign in front. */
const number = /^[("']*[±+*£#-]?(?:\d[\d.,:]*(?:\/\d+)?|\.\d+)$/;
const isNumber = (word: ReadingWord | undefined): boolean => word !== undefined && number.test(word.text);
/** A word in its parts: a number that may be glued to it, the letters, and what closes it. */
const parts = /^([("']*[±+*£#-]?(?:\d[\d.,]*|\.\d+)?-?)([A-Za-z¢µ/]+)([).,;:]*)$/;

function habitOf(words: readonly ReadingWord[]): PageHabit {
  const units = words.flatMap((word, index) => {
    const [, glued = '', letters = ''] = parts.exec(word.text) ?? [];
    return letters !== '' && (/\d/.test(glued) || isNumber(words[index - 1])) ? [letters] : [];
  });
  const printsPeriodUnits = units.some((unit) => /^(kc|mc|ke|me|cps|mmf|mmfd|mfd)$/.test(unit));
  return {
    printsMicro: units.some(betraysMicro) || (printsPeriodUnits && units.includes('pf')),
    printsTolerances: printsTolerances(words),
    printsPeriodUnits,
    partsUnits: partsUnitsOn(words),
  };
}

/**
 * Grammar and picture together: where both say the same there is no doubt; where the picture bears the reading out, the
 * grammar puts no ± there; where it shows another sign, that is taken, and is a guess unless the grammar says so too.
 */
function withPicture(word: ReadingWord, near: Near, habit: PageHabit): Mended | null {
  const mended = mendedWord(word, near, habit);
  const { seen } = word;
  if (seen === undefined) return mended;
  if (seen === word.text) return mended !== null && mended.text.includes('±') ? null : mended;
  if (mended?.text === seen) return { text: seen, sure: true };
  const further = mendedWord({ ...word, text: seen }, near, habit);
  return { text: further?.text ?? seen, sure: mended !== null && mended.text === further?.text };
}

function mendedWord(word: ReadingWord, near: Near, habit: PageHabit): Mended | null {
  return (
    mendedRating(word.text) ??
    mendedUnit(word, near, habit) ??
    mendSign(word.text, near, habit) ??
    mendedColon(word, near) ??
    mendedPoint(word.text) ??
    mendedNumeral(word.text, near) ??
    parted(word.text, habit) ??
    mendDesignator(word.text)
  );
}

/** A quotation is closed within so many words; a quote that is not is a speck. */
const longestQuotation = 14;

const withoutStrayQuotes = (words: readonly ReadingWord[]): ReadingWord[] =>
  words.map((word, index) => {
    const text = word.text.replace(/^["'‘’“”](?=[A-Z0-9(])/, '');
    const isClosed = words.slice(index, index + longestQuotation).some((each) => /["'’”][.,;:)]*$/.test(each.text));
    return text === word.text || isClosed ? word : applied(word, { text, sure: true });
  });

/** `vdew`: the v of the voltage and the kind of voltage run together. */
const mendedRating = (text: string): Mended | null =>
  /^(\d*)\.?v\.?d[ceo][wu]([.,;]?)$/i.test(text)
    ? {
        text: text.replace(
          /^(\d*)\.?v\.?d[ceo][wu]/i,
          (_, figure: string) => `${figure}${figure === '' ? '' : ' '}v dcw`,
        ),
        sure: false,
      }
    : null;

function mendedUnit({ text }: ReadingWord, { before }: Near, habit: PageHabit): Mended | null {
  const [, glued = '', letters = '', close = ''] = parts.exec(text) ?? [];
  if (letters === '' || !isUnitPlace({ glued, letters, close }, before)) return null;
  const value = /\d/.test(glued) ? glued : (before?.text ?? '');
  const mended = mendUnit(letters) ?? micro(letters, value, habit);
  return mended === null ? null : { text: glued + mended.text + close, sure: mended.sure };
}

type Parts = { glued: string; letters: string; close: string };

/** Letters may be a unit behind a number, behind `v` as in `400 v dcw`, and in the head of a column: `(kc)`. */
function isUnitPlace({ glued, letters, close }: Parts, before: ReadingWord | undefined): boolean {
  // A letter glued to figures is more often part of a name, as in 6AQ5 or 2N404.
  if (/\d/.test(glued)) return letters.length > 1 || letters === 'Q';
  const isInHead = glued === '(' && /^[km][e¢]$/.test(letters) && close.startsWith(')');
  return isNumber(before) || isInHead || isDirectCurrent(letters, before);
}

/** `400 v dcw`, whose last word is read as dew. */
const isDirectCurrent = (letters: string, before: ReadingWord | undefined): boolean =>
  /^d[eo]w$/.test(letters) && before !== undefined && /^v\.?$|\dv$/i.test(before.text);

/**
 * `pf` and `uf` stay what they are unless the manual prints µ, or is of the time of kc and mc, before the picofarad came
 * in; `.01 pf` is no capacitor anyone sold.
 */
function micro(letters: string, value: string, { printsMicro, printsPeriodUnits }: PageHabit): Mended | null {
  const text = microFor(letters);
  if (text === undefined) return null;
  const isFraction = /^["'(]*0?\.\d/.test(value);
  if (letters === 'pf' && isFraction) return { text, sure: true };
  const isAscii = letters.startsWith('u');
  return printsMicro || (printsPeriodUnits && !isAscii) ? { text, sure: false } : null;
}

/** A point read as a colon or doubled, in front of a unit; elsewhere it may be a ratio or a time. */
function mendedColon({ text }: ReadingWord, { next }: Near): Mended | null {
  if (!/^[(]?[+±-]?\d{1,3}[:;]\d+$/.test(text) || next === undefined) return null;
  const unit = next.text.replace(/[).,;:]+$/, '');
  const isUnit = /^[kKMmµpu]?(c|v|a|h|f|w|Ω|Q|meg|volts?)$/.test(unit) || mendUnit(unit) !== null;
  return isUnit ? { text: text.replace(/[:;]/, '.'), sure: false } : null;
}

/** `,005`: nothing but a point stands in front of a fraction. */
const mendedPoint = (text: string): Mended | null =>
  /^[("']?,\d{2,}[).,;]*$/.test(text) ? { text: text.replace(',', '.'), sure: true } : null;

/** "SECTION Ill": capitals behind such a word are a Roman numeral; and "IST" is the first of something. */
function mendedNumeral(text: string, { before }: Near): Mended | null {
  if (text === 'IST') return { text: '1ST', sure: false };
  if (before === undefined || !/^(section|chapter|part|appendix)$/i.test(before.text)) return null;
  return /^[Il1|]{2,3}$/.test(text) ? { text: 'I'.repeat(text.length), sure: true } : null;
}

/** Units that no name of a part or a section ends in, so that figures glued to them are figures. */
const partedUnits =
  /^([(±+-]?(?:\d[\d.,]*|\.\d+))(v|K|w|meg|mfd|mmf|ma|mc|kc|mv|db|ohms|volts|[µ]{1,2}[fhv])([).,;:]*)$/;

/** On a page that sets a space between figure and unit, one that is missing was lost in reading. */
function parted(text: string, { partsUnits }: PageHabit): Mended | null {
  const [, figure, unit, close = ''] = (partsUnits && partedUnits.exec(text)) || [];
  return figure === undefined ? null : { text: `${figure} ${unit}${close}`, sure: true };
}

const fewestParted = 5;
const leastPartedShare = 0.75;

function partsUnitsOn(words: readonly ReadingWord[]): boolean {
  const glued = words.filter(({ text }) => partedUnits.test(text)).length;
  const apart = words.filter(({ text }, index) => isNumber(words[index - 1]) && partedUnits.test(`1${text}`)).length;
  return apart >= fewestParted && apart >= (apart + glued) * leastPartedShare;
}
