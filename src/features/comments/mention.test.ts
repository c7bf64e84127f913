import { describe, expect, it } from 'vitest';
import { cutAtNames, mentionAt, peopleFor, withMention } from './mention.ts';

const people = [
  { id: '1', name: 'Ada Reed' },
  { id: '2', name: 'Ada Reedham' },
  { id: '3', name: 'Bram Ness' },
];

describe('an @ in the words', () => {
  it('is a mention from the @ to the caret', () => {
    expect(mentionAt('Ask @Ad', 7)).toEqual({ from: 4, query: 'Ad' });
    expect(mentionAt('Ask @Ada Re now', 11)).toEqual({ from: 4, query: 'Ada Re' });
    expect(mentionAt('@', 1)).toEqual({ from: 0, query: '' });
  });

  it('is none in an address, behind a new line, or without an @', () => {
    expect(mentionAt('ada@bench', 9)).toBeNull();
    expect(mentionAt('@Ada\nand', 8)).toBeNull();
    expect(mentionAt('Ask', 3)).toBeNull();
  });

  it('finds people by the beginning of any of their names', () => {
    expect(peopleFor('', people)).toHaveLength(3);
    expect(peopleFor('ree', people).map(({ id }) => id)).toEqual(['1', '2']);
    expect(peopleFor('bram n', people).map(({ id }) => id)).toEqual(['3']);
    expect(peopleFor('nobody', people)).toEqual([]);
    expect(peopleFor(' ', people)).toEqual([]);
  });

  it('is replaced by the name, with one space behind it', () => {
    expect(withMention('Ask @br', { from: 4, query: 'br' }, people[2]!)).toEqual({
      words: 'Ask @Bram Ness ',
      caret: 15,
    });
    expect(withMention('Ask @br now', { from: 4, query: 'br' }, people[2]!).words).toBe('Ask @Bram Ness now');
  });

  it('sets names apart, the longest first', () => {
    expect(cutAtNames('See @Ada Reedham.', people)).toEqual([
      { text: 'See ', isName: false },
      { text: '@Ada Reedham', isName: true },
      { text: '.', isName: false },
    ]);
  });
});
