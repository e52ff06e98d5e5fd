import type { PointerKind } from './hit-test';
import { nextTool } from './tools/next-tool';
import { IDLE, type Pointer, type ToolContext, type ToolEvent, type ToolState } from './tools/tool';

/** The part of a pointer event that a gesture needs. */
export type PointerSource = {
  readonly pointerId: number;
  readonly pointerType: string;
  readonly clientX: number;
  readonly clientY: number;
};

export type GestureSurfaceOptions = {
  readonly element: HTMLElement;
  readonly context: () => ToolContext;
  readonly onToolChange: (state: ToolState) => void;
  /** The pointer left the canvas: others need not see a crosshair any longer. */
  readonly onLeave: () => void;
};

/** Zoom of one step of a wheel, as the exponent of a pixel; pinching on a touch pad sends small steps. */
const WHEEL = { turn: 0.0016, pinch: 0.012 } as const;

/**
 * The one place where pointers of the canvas are read. Moves are gathered and told once per frame, before it is
 * painted; a press or a release is told at once, after the moves before it.
 */
export class GestureSurface {
  private tool: ToolState = IDLE;
  private readonly held = new Set<number>();
  private readonly moves = new Map<number, Pointer>();
  private frame: number | null = null;
  private readonly stops: (() => void)[] = [];

  constructor(private readonly options: GestureSurfaceOptions) {
    const { element } = options;
    this.listen(element, 'pointerdown', (event) => this.press(event));
    this.listen(window, 'pointermove', (event) => this.move(event));
    this.listen(window, 'pointerup', (event) => this.release(event, 'up'));
    this.listen(window, 'pointercancel', (event) => this.release(event, 'cancel'));
    this.listen(element, 'pointerleave', (event) => {
      if (event.pointerType === 'mouse' && this.held.size === 0) options.onLeave();
    });
    this.listen(element, 'wheel', (event) => this.wheel(event), { passive: false });
    this.listen(element, 'contextmenu', (event) => {
      if (this.tool.name !== 'idle') event.preventDefault();
    });
    this.listen(window, 'blur', () => this.cancel());
  }

  /** A part from the shelf comes under a pointer that is down already; the editor holds the part. */
  startPlacing(source: PointerSource): void {
    this.held.add(source.pointerId);
    this.become({ name: 'placing', pointerId: source.pointerId });
  }

  /** The next tap is for a comment. */
  startCommenting(): void {
    this.cancel();
    this.become({ name: 'commenting' });
  }

  /** Gives up what is going on; false when nothing was. */
  cancel(): boolean {
    if (this.tool.name === 'idle') return false;
    this.moves.clear();
    this.tell({ kind: 'cancel' });
    return true;
  }

  /** Stops listening. */
  dispose(): void {
    this.cancel();
    if (this.frame !== null) cancelAnimationFrame(this.frame);
    for (const stop of this.stops) stop();
  }

  private press(event: PointerEvent): void {
    if (event.button !== 0) return;
    this.options.element.setPointerCapture(event.pointerId);
    this.held.add(event.pointerId);
    this.flush();
    this.tell({ kind: 'down', pointer: this.read(event) });
  }

  private move(event: PointerEvent): void {
    const over = event.target instanceof Node && this.options.element.contains(event.target);
    if (!this.held.has(event.pointerId) && !over) return;
    this.moves.set(event.pointerId, this.read(event));
    this.frame ??= requestAnimationFrame(() => {
      this.frame = null;
      this.flush();
    });
  }

  private release(event: PointerEvent, kind: 'up' | 'cancel'): void {
    if (!this.held.delete(event.pointerId)) return;
    this.flush();
    this.tell(kind === 'up' ? { kind, pointer: this.read(event) } : { kind });
  }

  private wheel(event: WheelEvent): void {
    event.preventDefault();
    const pixels = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * 16 : event.deltaY;
    const factor = Math.exp(-pixels * (event.ctrlKey ? WHEEL.pinch : WHEEL.turn));
    this.options.context().zoom(this.place(event), factor);
  }

  private flush(): void {
    const moves = [...this.moves.values()];
    this.moves.clear();
    for (const pointer of moves) this.tell({ kind: 'move', pointer });
  }

  private tell(event: ToolEvent): void {
    this.become(nextTool(this.tool, event, this.options.context()));
  }

  private become(next: ToolState): void {
    if (next === this.tool) return;
    const changed = next.name !== this.tool.name;
    this.tool = next;
    if (changed) this.options.onToolChange(next);
  }

  private read(event: PointerSource): Pointer {
    return { id: event.pointerId, kind: kindOf(event.pointerType), at: this.place(event) };
  }

  private place(event: { readonly clientX: number; readonly clientY: number }) {
    const box = this.options.element.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  }

  private listen<K extends keyof HTMLElementEventMap>(
    on: HTMLElement | Window,
    name: K,
    handle: (event: HTMLElementEventMap[K]) => void,
    options?: AddEventListenerOptions,
  ): void {
    const listener = handle as EventListener;
    on.addEventListener(name, listener, options);
    this.stops.push(() => on.removeEventListener(name, listener, options));
  }
}

function kindOf(pointerType: string): PointerKind {
  return pointerType === 'mouse' || pointerType === 'pen' ? pointerType : 'touch';
}
