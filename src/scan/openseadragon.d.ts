/** The part of OpenSeadragon 5 that is used here; the package brings no types of its own. */
declare module 'openseadragon' {
  export type Point = { x: number; y: number };
  export type Rect = { x: number; y: number; width: number; height: number };
  export type Level = { url: string; width: number; height: number };
  export type Viewport = {
    zoomBy: (factor: number) => Viewport;
    zoomTo: (zoom: number, refPoint?: Point, immediately?: boolean) => Viewport;
    panBy: (delta: Point) => Viewport;
    panTo: (centre: Point, immediately?: boolean) => Viewport;
    applyConstraints: (immediately?: boolean) => Viewport;
    goHome: (immediately?: boolean) => Viewport;
    fitBounds: (bounds: Rect, immediately?: boolean) => Viewport;
    getBounds: (current?: boolean) => Rect;
    imageToViewportRectangle: (rect: Rect) => Rect;
    imageToViewerElementCoordinates: (point: Point) => Point;
    viewerElementToImageCoordinates: (point: Point) => Point;
  };
  export type CanvasEvent = {
    position: Point;
    quick?: boolean;
    preventDefaultAction?: boolean;
    preventVerticalPan?: boolean;
  };
  export type Viewer = {
    canvas: HTMLElement;
    container: HTMLElement;
    viewport: Viewport | null;
    isOpen: () => boolean;
    open: (source: object) => void;
    addHandler: (name: string, handler: (event: CanvasEvent) => void) => void;
    destroy: () => void;
  };
  type Statics = {
    (options: object): Viewer;
    Point: new (x: number, y: number) => Point;
    Rect: new (x: number, y: number, width: number, height: number) => Rect;
  };
  const OpenSeadragon: Statics;
  export default OpenSeadragon;
}
