import { type KeyboardEvent, type ReactNode, memo, useEffect, useEffectEvent, useMemo, useRef, useState } from 'react';
import type { Zone } from '#shared/document/define-block.ts';
import { Button } from '#src/ui/button.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { MarkButton, MarkPlace, useMarking } from './mark-place.tsx';
import { openScan, type OpenScan, type ScanPlace } from './open-scan.ts';
import { boxAt, type ScanBox } from './scan-boxes.ts';
import './scan.css';

type Props = {
  pageId: string;
  /** Changes when the picture may have. */
  version: string;
  /** Null while the page has no picture yet. */
  size: { width: number; height: number } | null;
  label: string;
  boxes: readonly ScanBox[];
  active: string | null;
  onHover?: (key: string | null) => void;
  onPick?: (key: string) => void;
  /** Brought into sight, enlarged, whenever it changes to another. */
  focusBox?: Zone | null;
  /** Lets a person mark a place of the scan, for a comment. */
  onMark?: ((zone: Zone) => void) | undefined;
};

const zoomStep = 1.4;
const panStep = 0.15;

/** The scan of a page: deep zoom, and the zones of the page drawn over it. */
export function ScanViewer({
  pageId,
  version,
  size,
  label,
  boxes,
  active,
  onHover,
  onPick,
  focusBox = null,
  onMark,
}: Props) {
  const frame = useRef<HTMLDivElement>(null);
  const overlay = useRef<SVGGElement>(null);
  const scan = useRef<OpenScan | null>(null);
  const marking = useMarking(size, onMark);
  const [isOpen, setOpen] = useState(false);
  const [hasFailed, setFailed] = useState(false);
  const onMove = useEffectEvent((now: ScanPlace) => {
    marking.movedTo(now);
    overlay.current?.setAttribute('transform', `translate(${now.x} ${now.y}) scale(${now.scale})`);
  });
  const hover = useEffectEvent((point: { x: number; y: number } | null) =>
    onHover?.(point === null ? null : (boxAt(boxes, point)?.key ?? null)),
  );
  const pick = useEffectEvent((point: { x: number; y: number }) => {
    const box = boxAt(boxes, point);
    if (box !== null) onPick?.(box.key);
  });
  const { width, height } = size ?? { width: 0, height: 0 };
  useEffect(() => {
    if (frame.current === null || width === 0) return;
    setFailed(false);
    const opened = openScan(
      frame.current,
      { pageId, version, width, height },
      { onMove, onHover: hover, onPick: pick, onProblem: () => setFailed(true), onOpen: () => setOpen(true) },
    );
    scan.current = opened;
    return () => {
      scan.current = null;
      setOpen(false);
      opened.close();
    };
  }, [pageId, version, width, height]);
  const focusKey = focusBox?.join();
  useEffect(() => {
    if (isOpen && focusKey !== undefined) scan.current?.lookAt(focusKey.split(',').map(Number) as Zone);
  }, [isOpen, focusKey]);
  if (size === null) return <NoPicture />;
  return (
    <section aria-label={label} className="scan">
      <ScanButtons scan={scan}>
        {onMark === undefined ? null : (
          <MarkButton isOn={marking.isOn} onPress={() => marking.turn(frame.current?.parentElement)} />
        )}
      </ScanButtons>
      {hasFailed ? (
        <Notice kind="doubt" title="Part of this picture could not be fetched.">
          It is tried again when you zoom or come back to the page.
        </Notice>
      ) : null}
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions -- the keys move the picture, as they would in a map */}
      <div
        role="application"
        aria-label={`${label}. Plus and minus zoom, the arrow keys move, 0 shows the whole page.`}
        // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a picture that can be moved by keys has to be reachable
        tabIndex={0}
        className="scan-frame"
        onKeyDown={(event) => {
          if (!marking.onKey(event)) onKey(event, scan.current);
        }}
      >
        <div ref={frame} className="scan-picture" />
        <svg className="scan-overlay" aria-hidden="true">
          <g ref={overlay}>
            <Boxes boxes={boxes} />
            <ActiveBox boxes={boxes} active={active} />
          </g>
        </svg>
        {marking.isOn ? <MarkPlace onMark={marking.mark} /> : null}
      </div>
    </section>
  );
}

function ScanButtons({ scan, children }: { scan: { current: OpenScan | null }; children: ReactNode }) {
  return (
    <div role="group" aria-label="Scan" className="leaf-tools screen-only">
      <Button onClick={() => scan.current?.zoomBy(zoomStep)}>Closer</Button>
      <Button onClick={() => scan.current?.zoomBy(1 / zoomStep)}>Further off</Button>
      <Button onClick={() => scan.current?.fitWidth()}>Fit width</Button>
      <Button onClick={() => scan.current?.fitPage()}>Whole page</Button>
      {children}
    </div>
  );
}

/** Drawn around the print instead of over it. */
const padding: Partial<Record<ScanBox['kind'], number>> = { note: 4 };

const Boxes = memo(function Boxes({ boxes }: { boxes: readonly ScanBox[] }) {
  return boxes.map(({ key, box: [x, y, width, height], kind }) => {
    const pad = padding[kind] ?? 0;
    return (
      <rect
        key={`${kind}-${key}`}
        data-kind={kind}
        x={x - pad}
        y={y - pad}
        width={width + 2 * pad}
        height={height + 2 * pad}
        vectorEffect="non-scaling-stroke"
      />
    );
  });
});

function ActiveBox({ boxes, active }: { boxes: readonly ScanBox[]; active: string | null }) {
  const found = useMemo(() => boxes.find(({ key }) => key === active), [boxes, active]);
  if (found === undefined) return null;
  const [x, y, width, height] = found.box;
  return (
    <rect
      data-kind="active"
      x={x - 4}
      y={y - 4}
      width={width + 8}
      height={height + 8}
      vectorEffect="non-scaling-stroke"
    />
  );
}

const moves: Record<string, (scan: OpenScan) => void> = {
  '+': (scan) => scan.zoomBy(zoomStep),
  '=': (scan) => scan.zoomBy(zoomStep),
  '-': (scan) => scan.zoomBy(1 / zoomStep),
  '0': (scan) => scan.fitPage(),
  ArrowLeft: (scan) => scan.panBy(-panStep, 0),
  ArrowRight: (scan) => scan.panBy(panStep, 0),
  ArrowUp: (scan) => scan.panBy(0, -panStep),
  ArrowDown: (scan) => scan.panBy(0, panStep),
};

function onKey(event: KeyboardEvent, scan: OpenScan | null): void {
  const move = moves[event.key];
  if (move === undefined || scan === null || event.ctrlKey || event.metaKey || event.altKey) return;
  event.preventDefault();
  move(scan);
}

const NoPicture = () => (
  <section aria-label="Scan" className="scan">
    <div className="scan-frame scan-empty">
      <p>The picture of this page has not been drawn yet. It appears here by itself.</p>
    </div>
  </section>
);
