import { useState } from 'react';
import type { Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';

/** Around the hit, in pixels of the page image (300 to the inch): a line above and below, some words to each side. */
const air = { x: 320, y: 60 };
const least = { width: 1100, height: 170 };

/** The stretch of the scan to show for a box: the box in the middle, as much around it as makes it readable. */
export function cropAround([x, y, w, h]: Zone): Zone {
  const width = Math.max(w + 2 * air.x, least.width);
  const height = Math.max(h + 2 * air.y, least.height);
  return [Math.max(0, x + w / 2 - width / 2), Math.max(0, y + h / 2 - height / 2), width, height].map(
    Math.round,
  ) as Zone;
}

type Size = { width: number; height: number };

/** The hit as it stands on the paper. */
export function HitCrop({ pageId, boxes, label }: { pageId: string; boxes: readonly Zone[]; label: string }) {
  const [size, setSize] = useState<Size | null>(null);
  const [first] = boxes;
  if (first === undefined) return null;
  const crop = cropAround(first);
  return (
    <span className="relative block overflow-hidden border border-rule bg-leaf">
      <img
        src={imageOf(pageId, { zone: crop })}
        alt={`The scan of page ${label} around this place`}
        loading="lazy"
        decoding="async"
        className="block h-auto w-full"
        style={{ aspectRatio: size === null ? `${crop[2]} / ${crop[3]}` : undefined }}
        // The server cuts the crop off at the edge of the page, so only the picture itself knows its size.
        onLoad={({ currentTarget }) =>
          setSize({ width: currentTarget.naturalWidth, height: currentTarget.naturalHeight })
        }
      />
      {size === null ? null : boxes.map((box) => <Marker key={box.join()} box={box} crop={crop} size={size} />)}
    </span>
  );
}

function Marker({ box: [x, y, w, h], crop, size }: { box: Zone; crop: Zone; size: Size }) {
  const left = (x - crop[0]) / size.width;
  const top = (y - crop[1]) / size.height;
  if (left >= 1 || top >= 1 || left + w / size.width <= 0 || top + h / size.height <= 0) return null;
  const inPercent = (share: number): string => `${share * 100}%`;
  return (
    <span
      aria-hidden="true"
      className="absolute bg-[#f3dc8e] mix-blend-multiply"
      style={{
        left: inPercent(left),
        top: inPercent(top),
        width: inPercent(w / size.width),
        height: inPercent(h / size.height),
      }}
    />
  );
}
