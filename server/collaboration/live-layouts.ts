import { EventEmitter } from 'node:events';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { LayoutState } from '../commands/commit-operations';
import { EstimatePool } from '../estimates/estimate-pool';
import { LayoutEstimates, type Estimating } from '../estimates/layout-estimates';
import type { Actor } from '../policies/policy';
import type { Comment } from '@/shared/api/comments';
import type { LayoutEstimate } from '@/shared/api/live';
import type { Revision } from '@/shared/api/revisions';
import type { CommittedOperation } from '@/shared/layout/operation';
import type { LayoutWriter } from './layout-writer';
import { LayoutWriters } from './layout-writers';

/** What watchers of a layout hear of. `present` writes it for one of them, with their abilities. */
export type LiveEvent =
  | {
      readonly kind: 'committed';
      readonly layoutId: string;
      readonly committed: readonly CommittedOperation[];
    }
  | { readonly kind: 'estimated'; readonly layoutId: string; readonly estimate: LayoutEstimate }
  | { readonly kind: 'comment'; readonly layoutId: string; present(actor: Actor): Comment }
  | { readonly kind: 'revision'; readonly layoutId: string; present(actor: Actor): Revision }
  | { readonly kind: 'layout-changed'; readonly layoutId: string };

/** What the open layouts of a process live on. */
export interface LiveLayoutsOptions {
  readonly sequelize: Sequelize;
  readonly log: Logger;
  /** Where estimates are computed; left out, in worker threads of its own. */
  readonly estimating?: Estimating & { close(): Promise<void> };
}

/** The open layouts of this process: their writers, their estimates, and what their watchers hear. */
export class LiveLayouts {
  readonly estimates: LayoutEstimates;
  readonly writers: LayoutWriters;
  private readonly pool: Estimating & { close(): Promise<void> };
  private readonly emitter = new EventEmitter();

  constructor({ sequelize, log, estimating }: LiveLayoutsOptions) {
    this.pool = estimating ?? new EstimatePool({ log });
    this.estimates = new LayoutEstimates(this.pool, log, (layoutId, estimate) =>
      this.announce({ kind: 'estimated', layoutId, estimate }),
    );
    this.writers = new LayoutWriters({
      sequelize,
      log,
      onCommitted: (layoutId, committed, state) => {
        this.announce({ kind: 'committed', layoutId, committed });
        this.estimates.want(layoutId, state);
      },
    });
  }

  /** The writer of a layout, and an estimate of it on its way if there is none. */
  async open(layoutId: string): Promise<LayoutWriter> {
    const writer = await this.writers.open(layoutId);
    this.estimates.want(layoutId, writer.state);
    return writer;
  }

  /** What is committed, once everything that arrived so far is. */
  async drainLayout(layoutId: string): Promise<LayoutState> {
    const writer = await this.writers.open(layoutId);
    return writer.drain();
  }

  /** Estimates a document for itself, whatever comes after it. */
  estimate(layoutId: string, state: LayoutState) {
    return this.pool.estimate(layoutId, state.document);
  }

  /** Tells the watchers of a layout. */
  announce(event: LiveEvent): void {
    this.emitter.emit('event', event);
  }

  /** Calls the listener with everything that watchers hear of; answers with the way to stop. */
  onEvent(listener: (event: LiveEvent) => void): () => void {
    this.emitter.on('event', listener);
    return () => this.emitter.off('event', listener);
  }

  /** Waits until everything that arrived is committed. */
  drain(): Promise<void> {
    return this.writers.drain();
  }

  /** Ends the worker threads; call it after `drain`. */
  close(): Promise<void> {
    return this.pool.close();
  }
}
