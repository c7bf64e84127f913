import { type Component, eachComponent } from './components.ts';
import { type GreyPicture, shrink } from './grey.ts';

const analysisDpi = 100;
/** Darker than half way to black, on paper made even: neither a shadow nor what shines through from the back. */
const darkBelow = 128;
/** Smaller than a punch hole (1/4 inch), larger than the boldest letter of a heading is thick. */
const leastInches = 0.17;
/** A round hole fills 0.79 of its box; letters fill less. */
const leastFill = 0.68;
/** Only what lies within so much of the edge may be the sheet's edge or the scanner's lid. */
const rimInches = 0.5;

/** Paints out punch holes, the dark beside the sheet and other patches that are neither print nor drawing. */
export function removePatches(picture: GreyPicture, dpi: number): GreyPicture {
  const factor = Math.max(1, Math.round(dpi / analysisDpi));
  const small = shrink(picture, factor);
  const smallDpi = dpi / factor;
  const ink = new Uint8Array(small.data.length);
  small.data.forEach((level, at) => {
    if (level < darkBelow) ink[at] = 1;
  });
  const data = picture.data.slice();
  eachComponent({ ...small, ink }, (found, pixels) => {
    if (isHole(found, smallDpi) || isBesideSheet(found, small, smallDpi))
      wipe(data, picture, { pixels, small, factor });
  });
  return { ...picture, data };
}

const isHole = ({ width, height, area }: Component, dpi: number): boolean =>
  Math.min(width, height) >= leastInches * dpi &&
  Math.max(width, height) <= Math.min(width, height) * 3 &&
  area >= width * height * leastFill;

/** Touches the edge of the picture and keeps close to it. */
function isBesideSheet(found: Component, { width, height }: GreyPicture, dpi: number): boolean {
  const rim = rimInches * dpi;
  const [right, bottom] = [found.x + found.width, found.y + found.height];
  return (
    (found.x <= 1 && right < rim) ||
    (right >= width - 1 && found.x > width - rim) ||
    (found.y <= 1 && bottom < rim) ||
    (bottom >= height - 1 && found.y > height - rim)
  );
}

/** Paints every pixel of the patch and one small pixel around it, for its edge is soft. */
function wipe(
  data: Uint8Array,
  { width, height }: GreyPicture,
  { pixels, small, factor }: { pixels: Int32Array; small: GreyPicture; factor: number },
): void {
  for (const pixel of pixels) {
    const [x, y] = [pixel % small.width, Math.floor(pixel / small.width)];
    const [left, right] = [Math.max(0, (x - 2) * factor), Math.min(width, (x + 3) * factor)];
    for (let row = Math.max(0, (y - 2) * factor); row < Math.min(height, (y + 3) * factor); row += 1)
      data.fill(255, row * width + left, row * width + right);
  }
}
