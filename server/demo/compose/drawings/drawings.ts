import type { DrawingName } from '#server/demo/content/types.ts';
import { hb12Front, sg4Front } from './fronts.ts';
import { hb12Chain } from './hb-12-chain.ts';
import { hb12Injection } from './hb-12-injection.ts';
import type { Drawing } from './ink.ts';
import { sg4Chain } from './sg-4-chain.ts';

export const drawings: Readonly<Record<DrawingName, Drawing>> = {
  'hb-12-front': hb12Front,
  'hb-12-chain': hb12Chain,
  'hb-12-injection': hb12Injection,
  'sg-4-front': sg4Front,
  'sg-4-chain': sg4Chain,
};

/** The strokes of a drawing without its lettering. */
export function svgOf({ width, height, shapes }: Drawing): string {
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">` +
    `<g fill="none" stroke="black" stroke-width="4" stroke-linejoin="round" stroke-linecap="round">${shapes.join('')}</g></svg>`
  );
}
