import { canonicalLetters, findUnit, unitDefinitions } from './definitions.ts';
import { parseQuantity } from './parse-quantity.ts';
import type { ParsedQuantity } from './parsed-quantity.ts';

/** What a text bent by recognition may have been. `confidence` runs from 0 to 1; 1 is kept for what a person has confirmed. */
export type QuantityProposal = { text: string; quantity: ParsedQuantity; confidence: number };

/** Letters taken for figures inside a number. The weights are rough: common practice, no source. */
const figureFor: Readonly<Record<string, string>> = {
  l: '1',
  I: '1',
  '|': '1',
  '!': '1',
  O: '0',
  o: '0',
  S: '5',
  B: '8',
  Z: '2',
};
const perFigure = 0.9;
/** What letters of units are taken for, as printed and as read; the same as in reading pages, on generated scans. */
const bentUnitLetters: Readonly<Record<string, readonly string[]>> = {
  c: ['e', 'o', '\u00A2'],
  '\u00B5': ['p', 'u', 'n', 'y', 'w'],
  '\u03A9': ['Q', 'n'],
  m: ['rn', 'nn'],
  k: ['lc', 'h'],
};
const perUnitLetter = 0.85;
/** As printed, unbent, and understood: all that can be said of it without looking at the paper. */
const understood = 0.98;
/** Where two different units may have been meant. */
const sharedBetweenUnits = 0.6;

type UnitReading = { spelling: string; confidence: number };
const byBentUnit = new Map<string, UnitReading[]>();
for (const { symbol, exact = [], anyCase = [] } of unitDefinitions) {
  for (const spelling of new Set([symbol, ...exact, ...anyCase].map(canonicalLetters))) {
    if (spelling.length < 2) continue;
    for (const { text, bends } of bentForms(spelling))
      byBentUnit.set(text, [...(byBentUnit.get(text) ?? []), { spelling, confidence: perUnitLetter ** bends }]);
  }
}

function bentForms(spelling: string): { text: string; bends: number }[] {
  let forms = [{ text: '', bends: 0 }];
  for (const letter of spelling) {
    const choices = [{ as: letter, bend: 0 }, ...(bentUnitLetters[letter] ?? []).map((as) => ({ as, bend: 1 }))];
    forms = forms.flatMap(({ text, bends }) =>
      choices.map(({ as, bend }) => ({ text: text + as, bends: bends + bend })),
    );
  }
  return forms.filter(({ bends }) => bends > 0 && bends <= 2);
}

/** Readings of a text that recognition may have bent, likeliest first; never more than five. Nothing is changed: a person chooses. */
export function proposeQuantities(read: string): QuantityProposal[] {
  const proposals = new Map<string, QuantityProposal>();
  const consider = (text: string, confidence: number): void => {
    const parsed = parseQuantity(text);
    if (!parsed.ok || (proposals.get(text)?.confidence ?? 0) >= confidence) return;
    proposals.set(text, { text, quantity: parsed.value, confidence: Math.min(confidence, understood) });
  };
  consider(read.trim(), understood);
  for (const { head, tail, confidence } of mendedNumbers(read.trim())) {
    consider(head + tail, confidence * understood);
    const [, space = '', word = '', rest = ''] = /^(\s*)([^\s\d]+)(.*)$/.exec(tail) ?? [];
    for (const unit of unitsFor(word)) consider(`${head}${space}${unit.spelling}${rest}`, confidence * unit.confidence);
  }
  return [...proposals.values()].sort((a, b) => b.confidence - a.confidence).slice(0, 5);
}

/** One spelling for each unit that may have been meant: the one bent least, and of those the shortest. */
function unitsFor(word: string): UnitReading[] {
  const best = new Map<string, UnitReading>();
  for (const reading of byBentUnit.get(canonicalLetters(word)) ?? []) {
    const unit = findUnit(reading.spelling);
    const known = unit.ok ? best.get(unit.value.symbol) : undefined;
    if (unit.ok && (known === undefined || known.confidence < reading.confidence)) best.set(unit.value.symbol, reading);
  }
  const share = best.size > 1 ? sharedBetweenUnits : 1;
  return [...best.values()].map(({ spelling, confidence }) => ({ spelling, confidence: confidence * share }));
}

/** The number at the start with its letters turned into figures, however far into the text it may go. */
function mendedNumbers(text: string): { head: string; tail: string; confidence: number }[] {
  const [, sign = '', number = ''] = /^([-+\u00B1\u2212]?\s*)([\dlIOoSBZ|!.,]+)/.exec(text) ?? [];
  if (number === '' || !/\d/.test(number)) return [];
  const figures = [...number].map((each) => figureFor[each] ?? each);
  const bends = figures.filter((each, at) => each !== number[at]).length;
  const tail = text.slice(sign.length + number.length);
  return [{ head: sign + figures.join(''), tail, confidence: perFigure ** bends }];
}
