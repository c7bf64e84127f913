import { describe, expect, it } from 'vitest';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import { maritimeVhf } from '#shared/calc/plans/maritime.ts';
import { compile } from '#shared/calc/program.ts';
import { proof } from '#shared/calc/proof.ts';
import { quantityDefinition } from '#shared/calc/quantity.ts';
import { demoManuals } from './manuals.ts';
import { shipFrequencyKc } from './maritime-channels.ts';

describe.each(demoManuals)('the proof of $title', ({ quantities }) => {
  it('holds for every printed number', () => {
    const definitions = quantities.map(({ printed, ...quantity }) =>
      quantityDefinition.parse({ ...quantity, printed: { text: printed.text } }),
    );
    const { holds, items } = proof(compile(definitions, builtInTables));
    expect(items.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(holds).toBe(true);
    expect(items).toHaveLength(quantities.length);
  });
});

it('prints the channels that the built-in plan has, reckoned apart from it', () => {
  for (const [channel = NaN, shipMc = NaN] of maritimeVhf.rows) {
    expect(Math.round(shipMc * 1000), `channel ${channel}`).toBe(shipFrequencyKc(channel));
  }
});
