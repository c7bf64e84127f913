import { describe, expect, it } from 'vitest';
import type { DocNode } from './define-block.ts';
import { block, doc, everyKind, paragraph, text, word } from './documents.fixture.ts';
import { type Anchor, anchor, anchorAt, findAnchor, longestQuote } from './find-anchor.ts';
import { flatTextOf } from './flat-text.ts';

const page = (...lines: DocNode[]): DocNode => doc(...lines);
const line = (id: string, ...content: DocNode[]): DocNode => block('paragraph', { id }, ...content);
const onWords = (document: DocNode, words: string, nth = 0): Anchor => {
  const flat = flatTextOf(document);
  let from = -1;
  for (let count = 0; count <= nth; count += 1) from = flat.text.indexOf(words, from + 1);
  const made = anchorAt(flat, { from, to: from + words.length });
  if (made === null) throw new Error('no anchor');
  return made;
};
const found = (document: DocNode, sought: Anchor) => {
  const flat = flatTextOf(document);
  const { stretch, ...rest } = findAnchor(flat, sought);
  return { ...rest, words: stretch === null ? null : flat.text.slice(stretch.from, stretch.to), from: stretch?.from };
};

const before = page(
  line(
    'a',
    word('Set', [10, 10, 30, 12]),
    text(' '),
    word('L5', [50, 10, 20, 12]),
    text(' to '),
    word('5.0', [90, 10, 30, 12]),
  ),
  line('b', word('Then', [10, 40, 40, 12]), text(' '), word('L5', [60, 40, 20, 12]), text(' again')),
);

describe('an anchor on words', () => {
  it('names their block, quotes them and keeps their place on the scan', () => {
    expect(onWords(before, 'L5 to 5.0')).toEqual({ block: 'a', quote: 'L5 to 5.0', at: 4, zone: [50, 10, 70, 12] });
  });

  it('takes the whole line when nothing is chosen, and never more than can be kept', () => {
    const flat = flatTextOf(before);
    const at = flat.text.indexOf('again');
    expect(anchorAt(flat, { from: at, to: at })).toMatchObject({ block: 'b', quote: 'Then L5 again' });
    const long = flatTextOf(page(line('a', text('word '.repeat(200)))));
    expect(anchorAt(long, { from: 3, to: 3 })?.quote).toHaveLength(longestQuote);
  });

  it('leaves out the spaces around, and is none where there are only spaces', () => {
    const flat = flatTextOf(before);
    expect(anchorAt(flat, { from: 3, to: 7 })?.quote).toBe('L5');
    expect(anchorAt(flat, { from: 3, to: 4 })).toBeNull();
  });

  it('of a cell names its table', () => {
    expect(onWords(everyKind(), '22-1470')).toMatchObject({ block: 't1', quote: '22-1470' });
  });

  it('counts a live value as it was printed', () => {
    expect(onWords(everyKind(), '156.600 mc')).toMatchObject({ block: 'b3', zone: [5, 6, 70, 12] });
  });

  it('without words, block and place is no anchor', () => {
    expect(anchor.safeParse({ block: null, quote: ' ', zone: null }).success).toBe(false);
    expect(anchor.parse({ block: null, quote: '', zone: [1, 2, 3, 4] }).at).toBe(0);
  });
});

describe('finding it again', () => {
  it('finds words where they stood', () => {
    expect(found(before, onWords(before, 'L5', 1))).toMatchObject({ state: 'found', words: 'L5', from: 19 });
  });

  it('follows the block when text is written ahead of it and within it', () => {
    const sought = onWords(before, '5.0');
    const after = page(
      line('new', text('Written ahead.')),
      line('a', text('Now carefully set L5 to '), word('5.0', [90, 10, 30, 12]), text(' volts')),
    );
    expect(found(after, sought)).toMatchObject({ state: 'found', words: '5.0', zone: [90, 10, 30, 12] });
  });

  it('tells the same words twice in a block apart by their place, and without places by their order', () => {
    const twice = page(line('a', word('L5', [10, 10, 20, 12]), text(' and '), word('L5', [90, 10, 20, 12])));
    expect(found(twice, onWords(twice, 'L5', 1))).toMatchObject({ from: 7, zone: [90, 10, 20, 12] });
    const typed = page(line('a', text('L5 and L5')));
    expect(found(typed, onWords(typed, 'L5', 1))).toMatchObject({ from: 7 });
  });

  it('finds them in another block when theirs has gone, nearest to where they stood', () => {
    const sought = onWords(before, 'L5', 1);
    const after = page(
      line('x', word('L5', [50, 10, 20, 12])),
      line('y', text('Moved '), word('L5', [60, 42, 20, 12])),
    );
    expect(found(after, sought)).toMatchObject({ state: 'found', zone: [60, 42, 20, 12] });
  });

  it('does not take a part of another number for them', () => {
    const sought = onWords(page(line('a', text('5'))), '5');
    expect(found(page(line('b', text('145.900'))), sought).state).toBe('changed');
    expect(found(page(line('b', text('145.900 and 5.'))), sought).state).toBe('found');
  });

  it('looks past other spaces and lines between the words', () => {
    const sought = onWords(before, 'Set L5 to 5.0');
    const after = page(line('a', text('Set  L5'), { type: 'hardBreak' }, text('to 5.0')));
    expect(found(after, sought)).toMatchObject({ state: 'found', words: 'Set  L5\nto 5.0' });
  });

  it('finds printed words that have become a live value', () => {
    const live = { type: 'liveValue', attrs: { quantity: 'q', printed: '5.0', zone: [90, 10, 30, 12] } };
    const after = page(line('a', text('Set L5 to '), live));
    expect(found(after, onWords(before, '5.0'))).toMatchObject({ state: 'found', words: '5.0' });
  });

  it('says that the text has changed when the words are gone, and keeps their place', () => {
    const after = page(line('a', word('Set', [10, 10, 30, 12]), text(' L6 to 5.1')));
    expect(found(after, onWords(before, '5.0'))).toMatchObject({
      state: 'changed',
      words: 'Set L6 to 5.1',
      zone: [90, 10, 30, 12],
    });
    expect(found(page(paragraph(text('Other.'))), onWords(before, '5.0'))).toMatchObject({
      state: 'changed',
      words: null,
      zone: [90, 10, 30, 12],
    });
  });

  it('holds a figure by its block, and a place of the scan by itself', () => {
    const onFigure: Anchor = { block: 'b5', quote: '', at: 0, zone: [10, 10, 500, 300] };
    expect(found(everyKind(), onFigure)).toMatchObject({ state: 'found', words: null, zone: [10, 10, 500, 300] });
    expect(found(before, onFigure)).toMatchObject({ state: 'changed', zone: [10, 10, 500, 300] });
    const onPlace: Anchor = { block: null, quote: '', at: 0, zone: [1, 2, 3, 4] };
    expect(found(before, onPlace)).toEqual({ state: 'place', words: null, from: undefined, zone: [1, 2, 3, 4] });
  });

  it.each(['Set', 'L5', '5.0', 'Then L5 again', '5.0\nThen'])('finds "%s" in the page it was made on', (words) => {
    expect(found(before, onWords(before, words))).toMatchObject({ state: 'found', words });
  });
});
