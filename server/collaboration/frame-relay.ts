/**
 * Passes on the newest of a fast stream of values: the first at once, later ones at most one in `intervalMs`.
 * A value that must not be lost is passed on at once and takes the place of the one that waits.
 */
export class FrameRelay<T> {
  private waiting: { value: T } | null = null;
  private timer: NodeJS.Timeout | undefined;
  private sentAt = -Infinity;

  constructor(
    private readonly intervalMs: number,
    private readonly send: (value: T) => void,
  ) {}

  /** Passes a value on, now or with the next frame. */
  push(value: T): void {
    const wait = this.sentAt + this.intervalMs - performance.now();
    if (wait <= 0 && this.timer === undefined) return this.pass(value);
    this.waiting = { value };
    this.timer ??= setTimeout(() => this.flush(), Math.max(0, wait));
  }

  /** Passes a value on now, in place of what waits. */
  pass(value: T): void {
    this.stop();
    this.sentAt = performance.now();
    this.send(value);
  }

  /** Forgets what waits. */
  stop(): void {
    clearTimeout(this.timer);
    this.timer = undefined;
    this.waiting = null;
  }

  private flush(): void {
    const { waiting } = this;
    this.timer = undefined;
    if (waiting !== null) this.pass(waiting.value);
  }
}
