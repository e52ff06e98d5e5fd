import type { Logger } from 'pino';
import type { LayoutEstimate } from '@/shared/api/live';
import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';

const KEPT = 200;

/** Where estimates are computed. */
export interface Estimating {
  estimate(layoutId: string, document: LayoutDocument): Promise<Estimate>;
}

/** A layout after its first `sequence` operations. */
export interface EstimatedState {
  readonly document: LayoutDocument;
  readonly sequence: number;
}

interface Line {
  /** Sequence that is being computed, null when nothing is. */
  running: number | null;
  next: EstimatedState | null;
}

/**
 * The newest estimate of each layout. While one is computed, only the newest state waits: what lies between is
 * dropped, because nobody needs the answer to a question that is out of date.
 */
export class LayoutEstimates {
  private readonly lines = new Map<string, Line>();
  private readonly estimates = new Map<string, LayoutEstimate>();

  constructor(
    private readonly pool: Estimating,
    private readonly log: Logger,
    private readonly onEstimated: (layoutId: string, estimate: LayoutEstimate) => void,
  ) {}

  /** The newest estimate, or null when none was computed since the start. */
  latest(layoutId: string): LayoutEstimate | null {
    return this.estimates.get(layoutId) ?? null;
  }

  /** Wants an estimate of a state, unless a newer one is known or wanted. */
  want(layoutId: string, state: EstimatedState): void {
    const known = this.estimates.get(layoutId);
    if (known && known.sequence >= state.sequence) return;
    const line = this.lines.get(layoutId) ?? { running: null, next: null };
    this.lines.set(layoutId, line);
    if (line.running !== null && line.running >= state.sequence) return;
    if (line.next === null || line.next.sequence < state.sequence) line.next = state;
    if (line.running === null) void this.work(layoutId, line);
  }

  private async work(layoutId: string, line: Line): Promise<void> {
    for (let state = line.next; state !== null; state = line.next) {
      line.next = null;
      line.running = state.sequence;
      try {
        const result = await this.pool.estimate(layoutId, state.document);
        this.keep(layoutId, { sequence: state.sequence, result });
      } catch (error) {
        this.log.error(
          { err: error, layout: layoutId, sequence: state.sequence },
          'a layout has no estimate',
        );
      }
    }
    line.running = null;
    this.lines.delete(layoutId);
  }

  private keep(layoutId: string, estimate: LayoutEstimate): void {
    this.estimates.delete(layoutId);
    this.estimates.set(layoutId, estimate);
    if (this.estimates.size > KEPT) this.estimates.delete(this.estimates.keys().next().value as string);
    this.onEstimated(layoutId, estimate);
  }
}
