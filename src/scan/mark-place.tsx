import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import type { Zone } from '#shared/document/define-block.ts';
import { Button } from '#src/ui/button.tsx';
import type { ScanPlace } from './open-scan.ts';

type Size = { width: number; height: number };
type Rect = { left: number; top: number; width: number; height: number };

/** Smaller than this, in pixels of the screen, it was a slip of the hand. */
const leastDrag = 8;
/** The part of the scan's frame that Enter takes. */
const frameShare = { width: 0.4, height: 0.25 };

export const middleOf = ({ width, height }: Size): Rect => ({
  left: (width * (1 - frameShare.width)) / 2,
  top: (height * (1 - frameShare.height)) / 2,
  width: width * frameShare.width,
  height: height * frameShare.height,
});

/** What lies under a rectangle of the screen, in pixels of the page; null where that is beside the page. */
export function zoneUnderRect(rect: Rect, { x, y, scale }: ScanPlace, page: Size): Zone | null {
  const [left, top] = [Math.max(0, (rect.left - x) / scale), Math.max(0, (rect.top - y) / scale)];
  const right = Math.min(page.width, (rect.left + rect.width - x) / scale);
  const bottom = Math.min(page.height, (rect.top + rect.height - y) / scale);
  const zone = [left, top, right - left, bottom - top].map(Math.round) as Zone;
  return zone[2] >= 1 && zone[3] >= 1 ? zone : null;
}

type Marking = {
  isOn: boolean;
  /** Begins or ends it; the keys then go to the frame that the scan lies in, and all of it comes into sight. */
  turn: (frame: HTMLElement | null | undefined) => void;
  mark: (rect: Rect) => void;
  /** Whether the key was meant for the marking. */
  onKey: (event: KeyboardEvent) => boolean;
  movedTo: (place: ScanPlace) => void;
};

/** The making of a mark on the scan, which ends by itself once there is one. */
export function useMarking(size: Size | null, onMark: ((zone: Zone) => void) | undefined): Marking {
  const place = useRef<ScanPlace>({ x: 0, y: 0, scale: 1 });
  const [isOn, setOn] = useState(false);
  const mark = (rect: Rect): void => {
    const zone = size === null ? null : zoneUnderRect(rect, place.current, size);
    if (zone === null) return;
    setOn(false);
    onMark?.(zone);
  };
  return {
    ...{ isOn, mark },
    turn: (frame) => {
      setOn(!isOn);
      frame?.focus({ preventScroll: true });
      frame?.scrollIntoView({ block: 'nearest' });
    },
    movedTo: (now) => {
      place.current = now;
    },
    onKey: (event) => {
      if (!isOn || (event.key !== 'Escape' && event.key !== 'Enter')) return false;
      event.preventDefault();
      if (event.key === 'Escape') setOn(false);
      else mark(middleOf(event.currentTarget.getBoundingClientRect()));
      return true;
    },
  };
}

export const MarkButton = ({ isOn, onPress }: { isOn: boolean; onPress: () => void }) => (
  <Button aria-pressed={isOn} className={isOn ? 'border-ink! bg-ink! text-leaf!' : ''} onClick={onPress}>
    Comment on a place
  </Button>
);

/** Lies over the scan while a place is marked: drawn by hand, or by bringing it under the frame in the middle. */
export function MarkPlace({ onMark }: { onMark: (rect: Rect) => void }) {
  const [drag, setDrag] = useState<{ from: [number, number]; to: [number, number] } | null>(null);
  const rect = drag === null ? null : rectOf(drag);
  const at = ({ currentTarget, clientX, clientY }: PointerEvent): [number, number] => {
    const { left, top } = currentTarget.getBoundingClientRect();
    return [clientX - left, clientY - top];
  };
  return (
    <div
      className="mark-place"
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        const point = at(event);
        setDrag({ from: point, to: point });
      }}
      onPointerMove={(event) => {
        // Read at once: by the time the state is worked out the event no longer says where it was.
        const to = at(event);
        setDrag((before) => (before === null ? null : { ...before, to }));
      }}
      onPointerUp={() => {
        setDrag(null);
        if (rect !== null && rect.width >= leastDrag && rect.height >= leastDrag) onMark(rect);
      }}
      onPointerCancel={() => setDrag(null)}
    >
      {rect === null ? <div className="mark-frame mark-middle" /> : <div className="mark-frame" style={rect} />}
      <p role="status" className="mark-hint">
        Draw a frame around the place. With the keys: bring it under the frame with the arrows, + and −, then press
        Enter. Escape stops.
      </p>
    </div>
  );
}

const rectOf = ({ from: [ax, ay], to: [bx, by] }: { from: [number, number]; to: [number, number] }): Rect => ({
  left: Math.min(ax, bx),
  top: Math.min(ay, by),
  width: Math.abs(ax - bx),
  height: Math.abs(ay - by),
});
