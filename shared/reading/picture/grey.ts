/** A grey picture: one byte a pixel, row by row, 0 black to 255 white. */
export type GreyPicture = { width: number; height: number; data: Uint8Array };

export const blankPicture = (width: number, height: number): GreyPicture => ({
  width,
  height,
  data: new Uint8Array(width * height).fill(255),
});

/** Shrinks by a whole factor, each new pixel the mean of the old ones it covers. */
export function shrink({ width, height, data }: GreyPicture, factor: number): GreyPicture {
  const small = blankPicture(Math.floor(width / factor), Math.floor(height / factor));
  const area = factor * factor;
  const sums = new Uint32Array(small.width);
  for (let y = 0; y < small.height; y += 1) {
    sums.fill(0);
    for (let row = y * factor; row < (y + 1) * factor; row += 1) {
      for (let x = 0, at = row * width; x < small.width; x += 1) {
        let sum = 0;
        for (const end = at + factor; at < end; at += 1) sum += data[at] ?? 255;
        sums[x] = (sums[x] ?? 0) + sum;
      }
    }
    for (let x = 0; x < small.width; x += 1) small.data[y * small.width + x] = (sums[x] ?? 0) / area;
  }
  return small;
}

/** The grey level that best parts ink from paper (Otsu, IEEE Trans. SMC 9(1), 1979: most variance between the two). */
export function inkThreshold({ data }: GreyPicture): number {
  const counts = new Uint32Array(256);
  // A million pixels spread over a page say the same as all eight.
  const step = Math.max(1, Math.floor(data.length / enoughPixels));
  let counted = 0;
  for (let at = 0; at < data.length; at += step, counted += 1) {
    const level = data[at] ?? 255;
    counts[level] = (counts[level] ?? 0) + 1;
  }
  let weighted = 0;
  for (let level = 0; level < 256; level += 1) weighted += level * (counts[level] ?? 0);
  let [dark, darkSum, best, threshold] = [0, 0, -1, 128];
  for (let level = 0; level < 256; level += 1) {
    dark += counts[level] ?? 0;
    darkSum += level * (counts[level] ?? 0);
    const light = counted - dark;
    if (dark === 0 || light === 0) continue;
    const gap = darkSum / dark - (weighted - darkSum) / light;
    const between = dark * light * gap * gap;
    if (between > best) [best, threshold] = [between, level];
  }
  return threshold;
}

const enoughPixels = 1 << 20;

/** 1 where there is ink, 0 where there is paper. */
export function inkOf(picture: GreyPicture, threshold = inkThreshold(picture)): Uint8Array {
  const { data } = picture;
  const ink = new Uint8Array(data.length);
  // A plain loop: a mapping function over eight million pixels takes ten times as long.
  for (let at = 0; at < data.length; at += 1) if ((data[at] ?? 255) <= threshold) ink[at] = 1;
  return ink;
}
