import { type GreyPicture, inkOf } from './grey.ts';

const steepestDegrees = 4;
const radians = Math.PI / 180;

/**
 * How far the lines of text lean, in degrees, positive when they fall to the right: the angle at which the ink
 * gathers in the fewest rows. Works best at about 100 dots an inch. Beyond ±4 degrees it is not looked for.
 */
export function skewDegrees(picture: GreyPicture): number {
  const points = inkPoints(picture);
  if (points.length < 400) return 0;
  const coarse = bestAngle(points, picture.height, { from: -steepestDegrees, to: steepestDegrees, by: 0.2 });
  return bestAngle(points, picture.height, { from: coarse - 0.2, to: coarse + 0.2, by: 0.025 });
}

/** Where the ink is, as x, y, x, y; the outermost rim is left out, for the shadow of the scanner's lid lies there. */
function inkPoints(picture: GreyPicture): Float64Array {
  const { width, height } = picture;
  const ink = inkOf(picture);
  const rim = Math.round(width * 0.03);
  const points: number[] = [];
  for (let y = rim; y < height - rim; y += 1) {
    for (let x = rim; x < width - rim; x += 1) if (ink[y * width + x] === 1) points.push(x, y);
  }
  return Float64Array.from(points);
}

function bestAngle(
  points: Float64Array,
  height: number,
  { from, to, by }: { from: number; to: number; by: number },
): number {
  let [best, bestEnergy] = [0, -1];
  for (let step = 0; step <= Math.round((to - from) / by); step += 1) {
    const degrees = from + step * by;
    const energy = rowEnergy(points, height, Math.tan(degrees * radians));
    if (energy > bestEnergy) [best, bestEnergy] = [degrees, energy];
  }
  return Math.round(best * 1000) / 1000;
}

function rowEnergy(points: Float64Array, height: number, slope: number): number {
  const offset = height;
  const rows = new Float64Array(height * 3);
  for (let at = 0; at < points.length; at += 2) {
    const row = Math.round((points[at + 1] ?? 0) - (points[at] ?? 0) * slope) + offset;
    rows[row] = (rows[row] ?? 0) + 1;
  }
  let energy = 0;
  for (const count of rows) energy += count * count;
  return energy;
}
