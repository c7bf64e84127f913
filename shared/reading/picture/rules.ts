import { type GreyPicture, inkThreshold } from './grey.ts';

/** A printed rule: a thin straight run of ink, with its box in pixels. */
export type Rule = { direction: 'across' | 'down'; x: number; y: number; length: number };

const shortestAcrossInches = 0.33;
const shortestDownInches = 0.22;
/** Ink may be missing for this long within a rule: paper grain, a faded stroke. */
const gapInches = 1 / 90;
const thickestInches = 0.03;

/**
 * Finds ruling lines and paints them out, for reading only: with its rules in place a table is lost to the engine.
 * `threshold` parts ink from paper. Lengths come from trials on generated scans of ruled parts lists.
 */
export function removeRules(picture: GreyPicture, dpi: number): { picture: GreyPicture; rules: Rule[] } {
  const threshold = Math.min(220, inkThreshold(picture) + 25);
  const cleaned = Uint8Array.from(picture.data);
  const rules: Rule[] = [];
  const scan = (direction: Rule['direction']): void => {
    const isAcross = direction === 'across';
    const lanes = isAcross ? picture.height : picture.width;
    const shortest = Math.round((isAcross ? shortestAcrossInches : shortestDownInches) * dpi);
    for (let lane = 0; lane < lanes; lane += 1) {
      for (const run of longRuns(picture, { isAcross, lane, shortest, threshold, gap: Math.round(gapInches * dpi) })) {
        if (!isThin(picture, { isAcross, lane, threshold, thickest: Math.round(thickestInches * dpi), ...run }))
          continue;
        paint(cleaned, picture, { isAcross, lane, ...run });
        rules.push(
          isAcross
            ? { direction, x: run.start, y: lane, length: run.length }
            : { direction, x: lane, y: run.start, length: run.length },
        );
      }
    }
  };
  scan('across');
  scan('down');
  return { picture: { ...picture, data: cleaned }, rules };
}

type Run = { start: number; length: number };
type Lane = { isAcross: boolean; lane: number; threshold: number };

/** Runs of ink along a row or column that are at least so long, with small gaps allowed. */
function longRuns({ width, height, data }: GreyPicture, lane: Lane & { shortest: number; gap: number }): Run[] {
  const end = lane.isAcross ? width : height;
  const stride = lane.isAcross ? 1 : width;
  const base = lane.isAcross ? lane.lane * width : lane.lane;
  const runs: Run[] = [];
  let [start, last] = [-1, -1];
  const close = (): void => {
    if (start >= 0 && last - start + 1 >= lane.shortest) runs.push({ start, length: last - start + 1 });
    start = -1;
  };
  for (let at = 0; at < end; at += 1) {
    if ((data[base + at * stride] ?? 255) <= lane.threshold) {
      if (start < 0) start = at;
      last = at;
    } else if (start >= 0 && at - last > lane.gap) close();
  }
  close();
  return runs;
}

/** A rule has paper on both sides along most of its length; a dark patch or a drawing's shading has not. */
function isThin({ width, height, data }: GreyPicture, run: Lane & Run & { thickest: number }): boolean {
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
  return thin >= samples * 0.6;
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
