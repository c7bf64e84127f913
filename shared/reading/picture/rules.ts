import { type GreyPicture, inkThreshold } from './grey.ts';

/** A printed rule: a thin straight run of ink, with its box in pixels. */
export type Rule = { direction: 'across' | 'down'; x: number; y: number; length: number };

const shortestAcrossInches = 0.33;
const shortestDownInches = 0.22;
const thickestInches = 0.03;
/**
 * The second pass is for rules that are faded or worn: it takes lighter ink and longer gaps, but only where there is
 * paper on both sides nearly all along. A run of letters' crossbars looks like a short rule, so those must be as clear.
 */
const passes = [
  { lighter: 25, gapInches: 1 / 90, thinShare: 0.6 },
  { lighter: 45, gapInches: 1 / 45, thinShare: 0.9 },
];
const shortBelowInches = 1;
const shortThinShare = 0.9;

/**
 * Finds ruling lines and paints them out, for reading only: with its rules in place a table is lost to the engine.
 * `threshold` parts ink from paper. Lengths come from trials on generated scans of ruled parts lists.
 */
export function removeRules(picture: GreyPicture, dpi: number): { picture: GreyPicture; rules: Rule[] } {
  const inkBelow = inkThreshold(picture);
  const cleaned = picture.data.slice();
  const rules: Rule[] = [];
  for (const { lighter, gapInches, thinShare } of passes) {
    const threshold = Math.min(225, inkBelow + lighter);
    const scan = { threshold, gap: Math.round(gapInches * dpi), thinShare, dpi };
    for (const isAcross of [true, false]) rules.push(...removedAlong(picture, cleaned, { ...scan, isAcross }));
  }
  return { picture: { ...picture, data: cleaned }, rules };
}

type Scan = { isAcross: boolean; threshold: number; gap: number; thinShare: number; dpi: number };

function removedAlong(picture: GreyPicture, cleaned: Uint8Array, scan: Scan): Rule[] {
  const { isAcross, threshold, gap, thinShare, dpi } = scan;
  const rules: Rule[] = [];
  const lanes = isAcross ? picture.height : picture.width;
  const shortest = Math.round((isAcross ? shortestAcrossInches : shortestDownInches) * dpi);
  const thickest = Math.round(thickestInches * dpi);
  for (let lane = 0; lane < lanes; lane += 1) {
    for (const run of longRuns(picture, { isAcross, lane, shortest, threshold, gap })) {
      const least = run.length < shortBelowInches * dpi ? Math.max(thinShare, shortThinShare) : thinShare;
      if (thinnessOf(picture, { isAcross, lane, threshold, thickest, ...run }) < least) continue;
      paint(cleaned, picture, { isAcross, lane, ...run });
      const { start, length } = run;
      rules.push(
        isAcross
          ? { direction: 'across', x: start, y: lane, length }
          : { direction: 'down', x: lane, y: start, length },
      );
    }
  }
  return rules;
}

type Run = { start: number; length: number };
type Lane = { isAcross: boolean; lane: number; threshold: number };

/**
 * Runs of ink along a row or column that are at least so long, with small gaps allowed. Only places that any such run
 * must cover are looked at, and the run is followed both ways from there: a page is mostly paper and short strokes.
 */
function longRuns(
  { width, height, data }: GreyPicture,
  { isAcross, lane, threshold, shortest, gap }: Lane & { shortest: number; gap: number },
): Run[] {
  const track: Track = {
    data,
    end: isAcross ? width : height,
    stride: isAcross ? 1 : width,
    base: isAcross ? lane * width : lane,
    threshold,
    gap,
  };
  const runs: Run[] = [];
  const step = Math.max(1, shortest - gap - 1);
  for (let probe = 0; probe < track.end; probe += step) {
    const first = inkFrom(track, probe);
    if (first < 0) continue;
    const start = followed(track, first, -1);
    const last = followed(track, first, 1);
    if (last - start + 1 >= shortest) runs.push({ start, length: last - start + 1 });
    while (probe + step <= last) probe += step;
  }
  return runs;
}

/** One row or column of a picture. */
type Track = { data: Uint8Array; end: number; stride: number; base: number; threshold: number; gap: number };

/** The first ink from here on, no farther than a gap; -1 where there is none. */
function inkFrom({ data, end, stride, base, threshold, gap }: Track, probe: number): number {
  const last = Math.min(end - 1, probe + gap);
  for (let at = probe; at <= last; at += 1) if ((data[base + at * stride] ?? 255) <= threshold) return at;
  return -1;
}

/** The last ink this way, over gaps that are small enough. */
function followed({ data, end, stride, base, threshold, gap }: Track, from: number, by: 1 | -1): number {
  let last = from;
  let paper = 0;
  for (let at = from + by; at >= 0 && at < end && paper <= gap; at += by) {
    if ((data[base + at * stride] ?? 255) <= threshold) {
      last = at;
      paper = 0;
    } else paper += 1;
  }
  return last;
}

/** The share of a run with paper on both sides: most of a rule, little of a dark patch or a drawing's shading. */
function thinnessOf({ width, height, data }: GreyPicture, run: Lane & Run & { thickest: number }): number {
  const { isAcross, lane, start, length, threshold, thickest } = run;
  const limit = isAcross ? height : width;
  const samples = 24;
  let thin = 0;
  for (let sample = 0; sample < samples; sample += 1) {
    const along = start + Math.floor(((sample + 0.5) * length) / samples);
    const inkAt = (across: number): boolean => {
      if (across < 0 || across >= limit) return false;
      const index = isAcross ? across * width + along : along * width + across;
      return (data[index] ?? 255) <= threshold;
    };
    let thickness = 1;
    for (let side = lane - 1; inkAt(side) && thickness <= thickest; side -= 1) thickness += 1;
    for (let side = lane + 1; inkAt(side) && thickness <= thickest; side += 1) thickness += 1;
    if (thickness <= thickest) thin += 1;
  }
  return thin / samples;
}

/** Paints a run white, one pixel to either side included: the soft edge of the stroke would be read as specks. */
function paint(
  target: Uint8Array,
  { width, height }: GreyPicture,
  { isAcross, lane, start, length }: Run & { isAcross: boolean; lane: number },
): void {
  for (let side = -1; side <= 1; side += 1) {
    const across = lane + side;
    if (across < 0 || across >= (isAcross ? height : width)) continue;
    for (let at = start; at < start + length; at += 1)
      target[isAcross ? across * width + at : at * width + across] = 255;
  }
}
