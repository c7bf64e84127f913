import { describe, expect, it } from 'vitest';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import { receiver } from '#shared/calc/harbour-receiver.fixture.ts';
import { compile } from '#shared/calc/program.ts';
import { inputKeys, nextKey } from './input-keys.ts';

describe('what a channel may be', () => {
  const keys = inputKeys(compile(receiver, builtInTables), 'channel');

  it('is what the table has, in words', () => {
    expect(keys?.words).toBe('1 to 28 and 60 to 88, from "VHF maritime mobile band"');
  });

  it('goes on behind the gap', () => {
    if (keys === null) throw new Error('no keys');
    expect([nextKey(keys, 28, 1), nextKey(keys, 60, -1), nextKey(keys, 88, 1)]).toEqual([60, 28, undefined]);
  });

  it('is not known for an input that no table is looked into with', () => {
    expect(inputKeys(compile(receiver, builtInTables), 'first_if')).toBeNull();
  });
});
