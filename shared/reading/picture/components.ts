/** A connected piece of ink: its box in pixels, how many of them are ink, and one of them. */
export type Component = { x: number; y: number; width: number; height: number; area: number };

type Ink = { width: number; height: number; ink: Uint8Array };

/** The connected pieces of ink (touching at a side or a corner), each given once to `take`, with its pixels. */
export function eachComponent(picture: Ink, take: (found: Component, pixels: Int32Array) => void): void {
  const left = picture.ink.slice();
  const list: PixelList = { pixels: new Int32Array(4096), count: 0 };
  for (let first = left.indexOf(1); first >= 0; first = left.indexOf(1, first + 1)) {
    list.count = 0;
    push(list, first, left);
    take(gather(picture, left, list), list.pixels.subarray(0, list.count));
  }
}

type PixelList = { pixels: Int32Array; count: number };

/** Adds a pixel to the list and takes it out of the ink that is left. */
function push(list: PixelList, pixel: number, left: Uint8Array): void {
  if (list.count === list.pixels.length) {
    const larger = new Int32Array(list.count * 2);
    larger.set(list.pixels);
    list.pixels = larger;
  }
  left[pixel] = 0;
  list.pixels[list.count] = pixel;
  list.count += 1;
}

/** Looks around every pixel of the list, which grows by what is found, and measures the whole. */
function gather({ width, height }: Ink, left: Uint8Array, list: PixelList): Component {
  let [fromX, toX, fromY, toY] = [width, 0, height, 0];
  for (let next = 0; next < list.count; next += 1) {
    const pixel = list.pixels[next] ?? 0;
    const x = pixel % width;
    const y = (pixel - x) / width;
    fromX = Math.min(fromX, x);
    toX = Math.max(toX, x);
    fromY = Math.min(fromY, y);
    toY = Math.max(toY, y);
    const last = Math.min(height - 1, y + 1) * width;
    for (let row = Math.max(0, y - 1) * width; row <= last; row += width) {
      const end = row + Math.min(width - 1, x + 1);
      for (let near = row + Math.max(0, x - 1); near <= end; near += 1) if (left[near] === 1) push(list, near, left);
    }
  }
  return { x: fromX, y: fromY, width: toX - fromX + 1, height: toY - fromY + 1, area: list.count };
}
