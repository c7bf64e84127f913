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

/** How likely each glyph is for ink that stands on a line of its own, as a small figure of a fraction does. */
export function oddsOnItsOwn(picture: GreyPicture, zone: Zone): (glyph: string) => number {
  const odds = oddsIn(picture, zone, { baseline: zone[1] + zone[3], capital: zone[3] });
  return (glyph) => odds?.[glyphs.indexOf(glyph)] ?? 0;
}

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
