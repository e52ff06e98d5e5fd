/** Where a process stands between its start and its end. */
export type Phase = 'starting' | 'ready' | 'stopping';

/** The phase of one process; what answers requests asks it. */
export class Lifecycle {
  private current: Phase = 'starting';

  get phase(): Phase {
    return this.current;
  }

  /** Goes on to a later phase; there is no way back. */
  enter(phase: 'ready' | 'stopping'): void {
    if (this.current !== 'stopping') this.current = phase;
  }
}
