import { describe, expect, it } from 'vitest';
import { block, doc, text, word } from '#shared/document/documents.fixture.ts';
import { changeBars } from './change-bars.ts';

const named = (id: string, words: string) => block('paragraph', { id }, text(words));

describe('change bars', () => {
  it('stand beside blocks whose words changed, beside new ones, and where something was taken out', () => {
    const before = doc(named('a', 'Gone'), named('b', 'Tune L5'), named('c', 'Lock it'), named('d', 'Gone too'));
    const after = doc(named('b', 'Tune L6'), named('c', 'Lock it'), named('e', 'New'));
    const { blocks, goneBehind } = changeBars(before, after, 'edition 1');
    expect([...blocks]).toEqual([
      ['b', 'changed'],
      ['e', 'new'],
    ]);
    expect([...goneBehind]).toEqual(['', 'c']);
  });

  it('do not stand where only marks or places differ', () => {
    const { blocks } = changeBars(doc(named('a', 'Tune')), doc(block('paragraph', { id: 'a' }, word('Tune'))), 'x');
    expect(blocks.size).toBe(0);
  });
});
