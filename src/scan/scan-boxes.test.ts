import { describe, expect, it } from 'vitest';
import { everyKind } from '#src/blocks/every-kind.fixture.ts';
import { boxAt, boxesOf } from './scan-boxes.ts';

describe('boxes over the scan', () => {
  const boxes = boxesOf(everyKind);

  it('stand for words, doubts, live values and blocks', () => {
    const kinds = new Map(boxes.map(({ key, kind }) => [key, kind]));
    expect(kinds.get('10,10,120,30')).toBe('word');
    expect(kinds.get('60,60,50,20')).toBe('doubt');
    expect(kinds.get('120,60,90,20')).toBe('live');
    expect(kinds.get('0,200,400,300')).toBe('block');
  });

  it('give the word under a point, not the block around it', () => {
    expect(boxAt(boxes, { x: 20, y: 20 })?.kind).toBe('word');
    expect(boxAt(boxes, { x: 200, y: 20 })?.kind).toBe('block');
    expect(boxAt(boxes, { x: 900, y: 900 })).toBeNull();
  });
});
