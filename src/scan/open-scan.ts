import OpenSeadragon, { type Viewer } from 'openseadragon';
import type { Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';

export type ScanSource = { pageId: string; version: string; width: number; height: number };
/** Where the image lies on the screen: its top left corner, and screen pixels for one of its own. */
export type ScanPlace = { x: number; y: number; scale: number };
export type ScanPoint = { x: number; y: number };

export type ScanEvents = {
  onMove: (place: ScanPlace) => void;
  onHover: (point: ScanPoint | null) => void;
  onPick: (point: ScanPoint) => void;
  onProblem: () => void;
  onOpen: () => void;
};

export type OpenScan = {
  zoomBy: (factor: number) => void;
  panBy: (right: number, down: number) => void;
  fitPage: () => void;
  fitWidth: () => void;
  /** Brings a zone into sight, enlarged so that it can be read, with some of its surroundings. */
  lookAt: (zone: Zone) => void;
  close: () => void;
};

/** Widths of the smaller pictures; the server keeps these. */
const levelWidths = [640, 1280, 2560];

const levelsOf = ({ pageId, version, width, height }: ScanSource) => [
  ...levelWidths
    .filter((each) => each < width)
    .map((each) => ({
      url: imageOf(pageId, { width: each, v: version }),
      width: each,
      height: Math.round((height * each) / width),
    })),
  { url: imageOf(pageId, { v: version }), width, height },
];

/** Puts a page image with deep zoom into an element. Close it when the element goes. */
export function openScan(element: HTMLElement, source: ScanSource, events: ScanEvents): OpenScan {
  const isCalm = window.matchMedia('(prefers-reduced-motion: reduce)').matches;
  const viewer = OpenSeadragon({
    element,
    drawer: 'canvas',
    showNavigationControl: false,
    showSequenceControl: false,
    animationTime: isCalm ? 0 : 0.15,
    springStiffness: 12,
    visibilityRatio: 0.3,
    minZoomImageRatio: 0.6,
    maxZoomPixelRatio: 3,
    // One press is for picking a word; enlarging is by wheel, pinch, keys and buttons.
    gestureSettingsMouse: { clickToZoom: false, dblClickToZoom: true },
    gestureSettingsTouch: { clickToZoom: false, dblClickToZoom: true },
    gestureSettingsPen: { clickToZoom: false },
    tileSources: { type: 'legacy-image-pyramid', levels: levelsOf(source) },
  });
  wire(viewer, events);
  return { ...movesOf(viewer, source), close: () => viewer.destroy() };
}

function wire(viewer: Viewer, { onMove, onHover, onPick, onProblem, onOpen }: ScanEvents): void {
  const tell = (): void => {
    const { viewport } = viewer;
    if (viewport === null || !viewer.isOpen()) return;
    const [corner, next] = [0, 1000].map((x) =>
      viewport.imageToViewerElementCoordinates(new OpenSeadragon.Point(x, 0)),
    );
    if (corner !== undefined && next !== undefined)
      onMove({ x: corner.x, y: corner.y, scale: (next.x - corner.x) / 1000 });
  };
  for (const name of ['open', 'update-viewport', 'resize']) viewer.addHandler(name, tell);
  viewer.addHandler('open', onOpen);
  viewer.addHandler('open-failed', onProblem);
  viewer.addHandler('tile-load-failed', onProblem);
  // The keys are ours: a leaf has no need to be turned round or over.
  viewer.addHandler('canvas-key', (event) => {
    event.preventDefaultAction = true;
  });
  viewer.addHandler('canvas-click', (event) => {
    if (event.quick === true && viewer.viewport !== null)
      onPick(viewer.viewport.viewerElementToImageCoordinates(event.position));
  });
  // Reachable once, on the frame around it.
  viewer.canvas.tabIndex = -1;
  viewer.canvas.addEventListener('pointermove', ({ clientX, clientY, buttons }) => {
    if (viewer.viewport === null || !viewer.isOpen() || buttons !== 0) return;
    const { left, top } = viewer.canvas.getBoundingClientRect();
    onHover(viewer.viewport.viewerElementToImageCoordinates(new OpenSeadragon.Point(clientX - left, clientY - top)));
  });
  viewer.canvas.addEventListener('pointerleave', () => onHover(null));
}

function movesOf(viewer: Viewer, { width, height }: ScanSource): Omit<OpenScan, 'close'> {
  const view = () => (viewer.isOpen() ? viewer.viewport : null);
  const fit = ([x, y, w, h]: Zone): void => {
    const viewport = view();
    viewport?.fitBounds(viewport.imageToViewportRectangle(new OpenSeadragon.Rect(x, y, w, h)));
  };
  return {
    zoomBy: (factor) => view()?.zoomBy(factor).applyConstraints(),
    panBy: (right, down) => {
      const bounds = view()?.getBounds();
      if (bounds !== undefined)
        view()
          ?.panBy(new OpenSeadragon.Point(right * bounds.width, down * bounds.height))
          .applyConstraints();
    },
    fitPage: () => view()?.goHome(),
    fitWidth: () => {
      const bounds = view()?.getBounds();
      if (bounds === undefined) return;
      const shape = bounds.height / bounds.width;
      fit([0, 0, width, Math.min(height, width * shape)]);
    },
    lookAt: (zone) => fit(surroundings(zone, width)),
  };
}

/** A word is shown with about a third of the page's width around it, so that a person sees where on the page it stands. */
function surroundings([x, y, w, h]: Zone, pageWidth: number): Zone {
  const wide = Math.min(pageWidth, Math.max(w * 1.25, pageWidth / 3));
  const high = Math.max(h * 3, wide / 3);
  return [Math.min(Math.max(0, x + w / 2 - wide / 2), pageWidth - wide), y + h / 2 - high / 2, wide, high];
}
