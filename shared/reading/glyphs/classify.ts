import type { Zone } from '#shared/document/define-block.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { type Network, likelihoods, unpacked } from './network.ts';
import { type LineMeasure, inkBox, inputs, patchOf } from './patch.ts';
import { first, glyphs, hidden, second } from './weights.ts';

/** What a piece of ink looks like, and how likely that is, from 0 to 1. */
export type Seen = { glyph: string; likelihood: number };

let network: Network | null = null;

/** What the ink within a box looks like; null where there is none. */
export function glyphIn(picture: GreyPicture, zone: Zone, line: LineMeasure): Seen | null {
  const odds = oddsIn(picture, zone, line);
  if (odds === null) return null;
  const likelihood = Math.max(...odds);
  return { glyph: glyphs[odds.indexOf(likelihood)] ?? '', likelihood };
}

/** Of two glyphs, how likely the first is, from 0 to 1; null where the ink looks like neither. */
export function firstOf(
  [one, other]: readonly [string, string],
  ...[picture, zone, line]: Parameters<typeof oddsIn>
): number | null {
  const odds = oddsIn(picture, zone, line);
  const [a, b] = [odds?.[glyphs.indexOf(one)] ?? 0, odds?.[glyphs.indexOf(other)] ?? 0];
  return a + b < leastEither ? null : a / (a + b);
}

const leastEither = 0.4;

function oddsIn(picture: GreyPicture, zone: Zone, line: LineMeasure): Float32Array | null {
  const box = inkBox(picture, zone);
  if (box === null || box[3] < 2) return null;
  network ??= {
    inputs,
    hidden,
    classes: glyphs.length,
    first: unpacked(first.packed, first.step),
    second: unpacked(second.packed, second.step),
  };
  return likelihoods(network, patchOf(picture, box, line));
}
