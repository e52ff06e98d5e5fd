import { setTimeout as delay } from 'node:timers/promises';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import { commitOperations, type LayoutState, type OperationEntry } from '../commands/commit-operations';
import { refuse, type Result } from '@/shared/errors';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';

const LARGEST_BATCH = 256;
// Well below the largest statement that MariaDB takes (16 MB), with every character escaped.
const LARGEST_BATCH_LENGTH = 4_000_000;
const ATTEMPTS = 3;
const RETRY_AFTER_MS = 150;
const JOB_TOUCHED_EVERY_MS = 60_000;

/** What a writer needs of its surroundings. */
export interface WriterContext {
  readonly sequelize: Sequelize;
  readonly log: Logger;
  /** Hears of every committed batch, in order. */
  onCommitted(layoutId: string, committed: readonly CommittedOperation[], state: LayoutState): void;
}

interface Waiting {
  readonly entry: OperationEntry;
  readonly answer: Promise<Result<number>>;
  resolve(answer: Result<number>): void;
}

/**
 * The one writer of a layout. Everything that arrives during a commit goes into the next transaction, so that
 * an answer means committed and the rate is not one write to the disk for each operation. Should another process
 * write to the same layout, the row's sequence tells, and the state is read anew.
 */
export class LayoutWriter {
  private known: LayoutState | null;
  private latest: LayoutState;
  private readonly queue: Waiting[] = [];
  private readonly waiting = new Map<string, Waiting>();
  private writing: Promise<void> | null = null;
  private jobTouchedAt = -Infinity;
  private usedAt = performance.now();

  constructor(
    readonly layoutId: string,
    private readonly jobId: string,
    state: LayoutState,
    private readonly context: WriterContext,
  ) {
    this.known = state;
    this.latest = state;
  }

  /** What is committed. */
  get state(): LayoutState {
    this.usedAt = performance.now();
    return this.latest;
  }

  /** Milliseconds since it was last asked for something; 0 while it writes. */
  get idleMs(): number {
    return this.writing === null ? performance.now() - this.usedAt : 0;
  }

  /** Queues an operation; answers once it is committed or refused. */
  submit(
    operation: Operation,
    member: { readonly id: string; readonly name: string },
  ): Promise<Result<number>> {
    this.usedAt = performance.now();
    const { id } = operation;
    const same = this.waiting.get(id);
    if (same) return same.answer;
    let resolve: (answer: Result<number>) => void = () => undefined;
    const answer = new Promise<Result<number>>((settle) => (resolve = settle));
    const changesText = JSON.stringify(operation.changes);
    const entry = { operation, changesText, memberId: member.id, memberName: member.name };
    const waiting: Waiting = { entry, answer, resolve };
    this.waiting.set(id, waiting);
    this.queue.push(waiting);
    this.writing ??= this.writeAll();
    return answer;
  }

  /** Waits until everything that arrived is committed or refused; answers with what is committed then. */
  async drain(): Promise<LayoutState> {
    while (this.writing !== null) await this.writing;
    return this.state;
  }

  private async writeAll(): Promise<void> {
    // What arrives in the same turn of the event loop belongs together.
    await new Promise((resolve) => setImmediate(resolve));
    while (this.queue.length > 0) await this.writeBatch(this.takeBatch());
    this.writing = null;
  }

  private takeBatch(): readonly Waiting[] {
    let length = 0;
    let count = 0;
    for (const { entry } of this.queue.slice(0, LARGEST_BATCH)) {
      length += entry.changesText.length;
      if (count > 0 && length > LARGEST_BATCH_LENGTH) break;
      count += 1;
    }
    return this.queue.splice(0, count);
  }

  private async writeBatch(batch: readonly Waiting[]): Promise<void> {
    const answers = await this.commit(batch.map((waiting) => waiting.entry));
    batch.forEach((waiting, index) => {
      this.waiting.delete(waiting.entry.operation.id);
      waiting.resolve(answers[index] ?? refuse('internal', 'The operation was lost. Try again.'));
    });
  }

  // An error may come after the commit has reached the disk: the state is read anew before the batch is tried
  // again, and what has its place by then is answered with it.
  private async commit(entries: readonly OperationEntry[]): Promise<readonly Result<number>[]> {
    for (let attempt = 1; ; attempt += 1) {
      try {
        return await this.commitOnce(entries);
      } catch (error) {
        this.known = null;
        this.context.log.error(
          { err: error, layout: this.layoutId, attempt },
          'operations could not be committed',
        );
        if (attempt >= ATTEMPTS) {
          return entries.map(() =>
            refuse('unavailable', 'The change could not be stored. It is sent again in a while.'),
          );
        }
        await delay(RETRY_AFTER_MS * attempt);
      }
    }
  }

  private async commitOnce(entries: readonly OperationEntry[]): Promise<readonly Result<number>[]> {
    const touches = performance.now() - this.jobTouchedAt > JOB_TOUCHED_EVERY_MS;
    const target = {
      layoutId: this.layoutId,
      known: this.known,
      touchedJobId: touches ? this.jobId : null,
    };
    const outcome = await commitOperations(this.context.sequelize, target, entries);
    this.known = outcome.state;
    this.latest = outcome.state;
    if (outcome.committed.length > 0) {
      if (touches) this.jobTouchedAt = performance.now();
      this.context.onCommitted(this.layoutId, outcome.committed, outcome.state);
    }
    return outcome.answers;
  }
}
