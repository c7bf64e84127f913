import type { Zone } from '#shared/document/define-block.ts';
import { eachComponent } from './components.ts';
import { type GreyPicture, inkOf } from './grey.ts';

/** Page numbers and running heads stand within this share of the page's height from its edge; the rim is the scanner's. */
const marginShare = 0.09;
const rimShare = 0.015;
/** Letters, not specks and not strokes: 4 to 20 points high. */
const leastHeightInches = 0.05;
const mostHeightInches = 0.28;
const fewestLetters = 2;

/**
 * Lines of print at the head and the foot of the page that no word was read from: the engine drops a lone page number
 * below columns as noise. Give it a picture of about 100 dots an inch without its rules, and the words in its pixels.
 */
export function unreadMargins(picture: GreyPicture, dpi: number, words: readonly Zone[]): Zone[] {
  const { width, height } = picture;
  const bands: [number, number][] = [
    [Math.round(height * rimShare), Math.round(height * marginShare)],
    [Math.round(height * (1 - marginShare)), Math.round(height * (1 - rimShare))],
  ];
  const letters: Zone[] = [];
  eachComponent({ ...picture, ink: inkOf(picture) }, (found) => {
    const isTall = found.height >= leastHeightInches * dpi && found.height <= mostHeightInches * dpi;
    const isInside = found.x > width * rimShare * 2 && found.x + found.width < width * (1 - rimShare * 2);
    if (isTall && isInside && found.width <= mostHeightInches * dpi * 2)
      letters.push([found.x, found.y, found.width, found.height]);
  });
  return bands.flatMap(([top, bottom]) => {
    if (words.some(([, y, , h]) => y + h / 2 >= top && y + h / 2 <= bottom)) return [];
    const own = letters.filter(([, y, , h]) => y >= top && y + h <= bottom);
    const line = own.filter(([, y, , h]) => Math.abs(y + h / 2 - middleOf(own)) < mostHeightInches * dpi * 0.5);
    return line.length < fewestLetters ? [] : [around(line)];
  });
}

function middleOf(zones: readonly Zone[]): number {
  const middles = zones.map(([, y, , h]) => y + h / 2).sort((a, b) => a - b);
  return middles[Math.floor((middles.length - 1) / 2)] ?? 0;
}

function around(zones: readonly Zone[]): Zone {
  const [left, top] = [Math.min(...zones.map(([x]) => x)), Math.min(...zones.map(([, y]) => y))];
  const right = Math.max(...zones.map(([x, , w]) => x + w));
  const bottom = Math.max(...zones.map(([, y, , h]) => y + h));
  return [left, top, right - left, bottom - top];
}
