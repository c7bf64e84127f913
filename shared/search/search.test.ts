import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { editDistance, foldLookAlikes, isClose } from '#shared/reading/look-alike.ts';
import { holdsAll, markHits } from './mark-hits.ts';
import { keyOf, quantitiesIn } from './quantities-in.ts';
import { fold, fullTextExpression, parseQuery, tokensOf, trigramExpression } from './query.ts';

describe('a query', () => {
  it('is words that must all occur, phrases in quotes, and starts of words', () => {
    expect(parseQuery('tune "first mixer" cry*')).toEqual([
      { tokens: ['tune'], prefix: false, typed: 'tune' },
      { tokens: ['first', 'mixer'], prefix: false, typed: 'first mixer' },
      { tokens: ['cry'], prefix: true, typed: 'cry*' },
    ]);
  });

  it('takes its last word for a start, because it may not be finished', () => {
    expect(parseQuery('tune inj').map(({ prefix }) => prefix)).toEqual([false, true]);
  });

  it('puts whatever was typed in quotes, so that none of it is a command', () => {
    expect(fullTextExpression(parseQuery('a" OR body:b'))).toBe('"a" AND "or" AND "body b"*');
    fc.assert(
      fc.property(fc.string(), (typed) => {
        const outside = fullTextExpression(parseQuery(typed)).replace(/"[^"]*"/g, '');
        return /^( AND |\*)*$/.test(outside);
      }),
    );
  });

  it('reads a number with a point as its digits in a row', () => {
    expect(fullTextExpression(parseQuery('16.211111'))).toBe('"16 211111"*');
  });

  it('has runs of three letters for words that recognition may have bent', () => {
    expect(trigramExpression(parseQuery('coil'))).toBe('("coi" OR "oil")');
    expect(trigramExpression(parseQuery('L5'))).toBeNull();
  });
});

describe('folding', () => {
  it('is done once: folding what is folded changes nothing', () => {
    fc.assert(fc.property(fc.string(), (typed) => fold(fold(typed)) === fold(typed)));
  });

  it('leaves out accents and capitals', () => {
    expect(tokensOf('Écran RÉGLÉ, 47 µµf')).toEqual(['ecran', 'regle', '47', 'µµf']);
  });
});

describe('words that look alike', () => {
  it.each([
    ['injeclion', 'injection'],
    ['C1O', 'c10'],
    ['rnixer', 'mixer'],
    ['osciIlator', 'oscillator'],
  ])('%s may be %s', (found, wanted) => {
    expect(isClose(found.toLowerCase(), wanted)).toBe(true);
  });

  it.each([
    ['plate', 'grid'],
    ['L5', 'L7'],
    ['12', '16'],
  ])('%s is not %s', (found, wanted) => {
    expect(isClose(found.toLowerCase(), wanted.toLowerCase())).toBe(false);
  });

  it('fold alike', () => {
    expect(foldLookAlikes('1O5')).toBe(foldLookAlikes('lo5'));
  });

  it('have a distance that is the same from either end and zero only for the same', () => {
    fc.assert(
      fc.property(
        fc.string(),
        fc.string(),
        (a, b) => editDistance(a, b) === editDistance(b, a) && (editDistance(a, b) === 0) === (a === b),
      ),
    );
  });
});

describe('marking hits', () => {
  const texts = [
    { text: 'Tune', zone: [1, 1, 40, 9] as [number, number, number, number] },
    { text: ' ', zone: null },
    { text: 'coil', zone: [50, 1, 40, 9] as [number, number, number, number] },
    { text: ' L5 to 0.455 MHz', zone: null },
  ];

  it('shows the stretch that was hit and its box', () => {
    const { snippet, marks, boxes } = markHits(texts, parseQuery('coi'));
    expect(marks.map(([from, to]) => snippet.slice(from, to))).toEqual(['coil']);
    expect(boxes).toEqual([[50, 1, 40, 9]]);
  });

  it('needs every term on the page', () => {
    expect(holdsAll(texts, parseQuery('tune coil'), false)).toBe(true);
    expect(holdsAll(texts, parseQuery('tune grid'), false)).toBe(false);
  });
});

describe('quantities in running text', () => {
  it('have one form however they are written', () => {
    expect(keyOf('455 kc')).toBe(keyOf('0.455 MHz'));
    expect(keyOf('455 kc')).not.toBe(keyOf('455 mc'));
    expect(quantitiesIn('from 455 kc up to 10.7 mc').map(({ key }) => key)).toEqual([
      keyOf('455 kc'),
      keyOf('10.7 MHz'),
    ]);
  });

  it('are not seen in words, plain numbers or nonsense', () => {
    expect(keyOf('coil')).toBeNull();
    expect(keyOf('12')).toBeNull();
    expect(quantitiesIn('see figure 5 and R12 of 1969')).toEqual([]);
  });
});
