import { type Component, eachComponent } from './components.ts';
import { type GreyPicture, inkOf } from './grey.ts';

// Sizes come from trials on generated parts lists with leaders; text pages lost nothing to them.
const largestDotInches = 0.032;
const smallestDotInches = 0.006;
/** From one dot to the next. */
const nearestInches = 0.02;
const farthestInches = 0.16;
/** An ellipsis has three dots, some typists make it four. */
const fewestDots = 5;
/** How far a dot may stand from where the ones before it make one expect it. */
const slackInches = 0.014;

/** Paints out the dots that lead the eye from a description to its figure: a parts list read with them is lost. */
export function removeLeaders(picture: GreyPicture, dpi: number): { picture: GreyPicture; dots: number } {
  const dots: Component[] = [];
  eachComponent({ ...picture, ink: inkOf(picture) }, (found) => {
    const [least, most] = [Math.min(found.width, found.height), Math.max(found.width, found.height)];
    if (most <= largestDotInches * dpi && least >= smallestDotInches * dpi) dots.push(found);
  });
  const leaders = evenRows(dots, dpi);
  const data = picture.data.slice();
  for (const dot of leaders) paintOut(data, picture, dot);
  return { picture: { ...picture, data }, dots: leaders.length };
}

const middleX = ({ x, width }: Component): number => x + width / 2;
const middleY = ({ y, height }: Component): number => y + height / 2;

/** The dots that stand in rows of five or more at even steps. */
function evenRows(dots: readonly Component[], dpi: number): Component[] {
  const byRow = new Map<number, Component[]>();
  for (const dot of dots) {
    const row = Math.round(middleY(dot));
    byRow.set(row, [...(byRow.get(row) ?? []), dot]);
  }
  const taken = new Set<Component>();
  for (const dot of [...dots].sort((a, b) => middleX(a) - middleX(b))) {
    if (taken.has(dot)) continue;
    const run = [dot];
    for (let next = following(run, byRow, dpi); next !== undefined; next = following(run, byRow, dpi)) run.push(next);
    if (run.length >= fewestDots) for (const each of run) taken.add(each);
  }
  return [...taken];
}

/** The nearest dot to the right at about the same height and, from the third on, at about the same step. */
function following(run: Component[], byRow: Map<number, Component[]>, dpi: number): Component | undefined {
  const [last, before] = [run.at(-1), run.at(-2)];
  if (last === undefined) return undefined;
  const slack = slackInches * dpi;
  const step = before === undefined ? undefined : middleX(last) - middleX(before);
  const row = Math.round(middleY(last));
  let best: Component | undefined;
  for (let y = row - Math.floor(slack); y <= row + Math.floor(slack); y += 1) {
    for (const dot of byRow.get(y) ?? []) {
      const gap = middleX(dot) - middleX(last);
      if (gap < nearestInches * dpi || gap > farthestInches * dpi) continue;
      if (step !== undefined && Math.abs(gap - step) > slack) continue;
      if (best === undefined || middleX(dot) < middleX(best)) best = dot;
    }
  }
  return best;
}

/** One pixel more on every side: the soft edge of a dot is a speck of its own. */
function paintOut(data: Uint8Array, { width, height }: GreyPicture, dot: Component): void {
  const [left, right] = [Math.max(0, dot.x - 1), Math.min(width, dot.x + dot.width + 1)];
  for (let y = Math.max(0, dot.y - 1); y < Math.min(height, dot.y + dot.height + 1); y += 1)
    data.fill(255, y * width + left, y * width + right);
}
