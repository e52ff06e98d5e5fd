import type { Box } from '@/shared/geometry/box';
import {
  betterTurn,
  fitBox,
  panBy,
  scaleRange,
  zoomAbout,
  type Insets,
  type ScreenPoint,
  type Size,
  type Turn,
  type Viewport,
} from './viewport';

/** What a fitted drawing shows, and where on the canvas it may lie. */
export type Frame = { readonly box: Box; readonly size: Size; readonly insets: Insets };

/** The view of one canvas. It stays fitted to its frame until somebody moves or zooms it. */
export interface ViewStore {
  getView(): Viewport | null;
  subscribe(listener: () => void): () => void;
  /** The canvas or the platform has another size. */
  setFrame(frame: Frame): void;
  pan(dx: number, dy: number): void;
  zoom(about: ScreenPoint, factor: number): void;
  /** Zooms about the middle of the free part of the canvas. */
  zoomMiddle(factor: number): void;
  fit(): void;
  /** Turns the drawing by a quarter and fits it. */
  turn(): void;
}

/** Makes the view of a canvas; it is null until a frame is set. */
export function createViewStore(): ViewStore {
  const listeners = new Set<() => void>();
  let view: Viewport | null = null;
  let frame: Frame | null = null;
  let moved = false;
  let chosenTurn: Turn | null = null;

  const show = (next: Viewport) => {
    view = next;
    for (const listener of listeners) listener();
  };
  const fit = () => {
    if (!frame) return;
    const { box, size, insets } = frame;
    moved = false;
    show(fitBox(box, size, insets, chosenTurn ?? betterTurn(box, size, insets)));
  };
  const zoom = (about: ScreenPoint, factor: number) => {
    if (!view || !frame) return;
    moved = true;
    show(zoomAbout(view, about, factor, scaleRange(frame.box, frame.size, frame.insets)));
  };
  return {
    getView: () => view,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    setFrame(next) {
      if (frame && sameFrame(frame, next)) return;
      frame = next;
      if (!moved || !view) fit();
    },
    pan(dx, dy) {
      if (!view) return;
      moved = true;
      show(panBy(view, dx, dy));
    },
    zoom,
    zoomMiddle(factor) {
      if (!frame) return;
      const { size, insets } = frame;
      const middle = {
        x: insets.left + (size.width - insets.left - insets.right) / 2,
        y: insets.top + (size.height - insets.top - insets.bottom) / 2,
      };
      zoom(middle, factor);
    },
    fit,
    turn() {
      chosenTurn = view?.turn === 'up' ? 'right' : 'up';
      fit();
    },
  };
}

function sameFrame(one: Frame, other: Frame): boolean {
  const flat = ({ box, size, insets }: Frame) => [
    ...[box.minX, box.minY, box.maxX, box.maxY, size.width, size.height],
    ...[insets.top, insets.right, insets.bottom, insets.left],
  ];
  const values = flat(other);
  return flat(one).every((value, index) => value === values[index]);
}
