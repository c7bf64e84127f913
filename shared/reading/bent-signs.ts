import type { ReadingWord } from './reading.ts';
import type { Mended, Near, PageHabit } from './mended.ts';

/** The English model cannot write ±: it comes out as one of these, as a figure 2 in front of the number, or not at all. */
const bent = String.raw`[+*£#$%&€§]+`;
const tolerance = new RegExp(String.raw`^(["'(]*)(${bent})?(\.?\d[\d.]*)(\s*%)?([).,;:]*)$`);
/** What parts were sold in, in percent: IEC 60062's classes and the crystal grades of the time. */
const usual = new Set(['.5', '0.5', '1', '2', '2.5', '3', '5', '10', '15', '20', '25', '30', '50']);
const isUsual = (figure: string): boolean => usual.has(figure) || /^0?\.0+\d+$/.test(figure);
const valueBefore = /(?:^|\d)(?:[kMmµupn]{0,2}[fhvΩQw]|[kK]|meg|mmf|mfd|ohms?|dcw|mc|kc)[,;]?$/;

const isPercent = (word: ReadingWord | undefined): boolean =>
  word !== undefined && /^(%|percent|per$)/i.test(word.text);
const isOneSided = (next: ReadingWord | undefined): boolean => next !== undefined && /^[-–]\d/.test(next.text);

/** Whether the page prints ± before its tolerances: most of them still show some sign. */
export function printsTolerances(words: readonly ReadingWord[]): boolean {
  const percents = words.flatMap(({ text }) => {
    const found = tolerance.exec(text);
    return found?.[4] !== undefined && isUsual(found[3] ?? '') ? [found[2] !== undefined] : [];
  });
  const signed = percents.filter(Boolean).length;
  return signed >= 3 && signed >= percents.length / 3;
}

type Percent = { open: string; sign: string | undefined; figure: string; percent: string | undefined; close: string };

function percentIn(text: string): Percent | null {
  const [, open = '', sign, figure, percent, close = ''] = tolerance.exec(text) ?? [];
  return figure === undefined ? null : { open, sign, figure, percent, close };
}

/** Puts ± back before a number with a percent sign, and as a guess before an offset in frequency. */
export function mendSign(text: string, near: Near, habit: PageHabit): Mended | null {
  const found = percentIn(text);
  if (found === null || isMoney(found, near)) return null;
  const { open, sign, figure, percent = '', close } = found;
  const withSign = `${open}±${figure}${percent}${close}`;
  if (percent === '' && !isPercent(near.next))
    return sign !== undefined && isOffset(near.next) ? { text: withSign, sure: false } : null;
  if (sign === undefined) return lostSign({ open, figure, tail: percent + close }, near, habit);
  return isOneSided(near.next) ? null : { text: withSign, sure: sign !== '+' || isUsual(figure) };
}

/** "$3 per ticket". */
const isMoney = ({ sign, percent }: Percent, { next }: Near): boolean =>
  sign === '$' && percent === undefined && !/^(%|percent)/i.test(next?.text ?? '');

/** `+9 kc`: no frequency is printed with a plus sign, but an offset is printed with ±. */
const isOffset = (next: ReadingWord | undefined): boolean =>
  next !== undefined && /^([km][ceo]|[kM]Hz|cps)[).,;]*$/.test(next.text);

/** Behind a part's value on a page that prints ±, a bare 5% has lost its sign, and 25% or 210% has it as a figure 2. */
function lostSign(
  { open, figure, tail }: { open: string; figure: string; tail: string },
  { before }: Near,
  habit: PageHabit,
): Mended | null {
  if (!habit.printsTolerances || before === undefined || !valueBefore.test(before.text)) return null;
  const inner = figure.startsWith('2') ? figure.slice(1) : '';
  if (isUsual(inner) && (figure === '25' || !isUsual(figure))) return { text: `${open}±${inner}${tail}`, sure: false };
  return isUsual(figure) ? { text: `${open}±${figure}${tail}`, sure: false } : null;
}
