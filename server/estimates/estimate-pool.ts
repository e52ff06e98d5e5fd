import { availableParallelism, totalmem } from 'node:os';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { Logger } from 'pino';
import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import type { EstimateAnswer, EstimateQuestion } from './estimate-messages';

const MOST_WORKERS = 2;
const LITTLE_MEMORY_BYTES = 2 * 1024 ** 3;
const ATTEMPTS = 2;
const TOO_LONG_MS = 120_000;

interface Job {
  readonly question: EstimateQuestion;
  attempt: number;
  resolve(result: Estimate): void;
  reject(error: Error): void;
}

interface Slot {
  worker: Worker | null;
  readonly jobs: Map<number, Job>;
  watchdog: NodeJS.Timeout | undefined;
}

/** How a pool is set up; tests choose another worker. */
export interface EstimatePoolOptions {
  readonly log: Logger;
  readonly workers?: number;
  readonly workerFile?: string;
}

/**
 * Worker threads that estimate, so that the event loop never does. A layout stays with its worker, which keeps
 * what it prepared for it. A question whose worker broke down is asked once more.
 */
export class EstimatePool {
  private readonly slots: Slot[];
  private readonly homes = new Map<string, Slot>();
  private readonly workerFile: string;
  private readonly log: Logger;
  private lastId = 0;
  private closed = false;

  constructor(options: EstimatePoolOptions) {
    this.log = options.log;
    this.workerFile = options.workerFile ?? join(__dirname, 'estimate-worker.ts');
    const count = options.workers ?? countWorkers();
    this.slots = Array.from({ length: count }, () => ({
      worker: null,
      jobs: new Map(),
      watchdog: undefined,
    }));
  }

  /**
   * Estimates a document in a worker thread.
   * @throws Error when it failed twice, or the pool was closed.
   */
  estimate(layoutId: string, document: LayoutDocument): Promise<Estimate> {
    if (this.closed) return Promise.reject(new Error('the estimates are stopped'));
    return new Promise<Estimate>((resolve, reject) => {
      const question = { id: (this.lastId += 1), layoutId, document };
      this.ask(this.chooseSlot(layoutId), { question, attempt: 1, resolve, reject });
    });
  }

  /** Stops the worker threads; open questions fail. */
  async close(): Promise<void> {
    this.closed = true;
    for (const slot of this.slots) {
      clearTimeout(slot.watchdog);
      for (const job of slot.jobs.values()) job.reject(new Error('the estimates are stopped'));
      slot.jobs.clear();
    }
    await Promise.all(this.slots.map((slot) => slot.worker?.terminate()));
  }

  private chooseSlot(layoutId: string): Slot {
    const home = this.homes.get(layoutId);
    const free = [...this.slots].sort((a, b) => a.jobs.size - b.jobs.size)[0];
    if (free === undefined) throw new Error('a pool without workers');
    const slot = home !== undefined && home.jobs.size <= free.jobs.size ? home : free;
    this.homes.delete(layoutId);
    this.homes.set(layoutId, slot);
    if (this.homes.size > 1000) this.homes.delete(this.homes.keys().next().value as string);
    return slot;
  }

  private ask(slot: Slot, job: Job): void {
    slot.worker ??= this.startWorker(slot);
    slot.jobs.set(job.question.id, job);
    this.watch(slot);
    slot.worker.postMessage(job.question);
  }

  private startWorker(slot: Slot): Worker {
    // The loader by `--require`: with `--import` a worker's own first file is not read as TypeScript.
    const worker = new Worker(this.workerFile, { execArgv: ['--require', 'tsx/cjs'] });
    worker.on('message', (answer: EstimateAnswer) => this.take(slot, answer));
    worker.on('error', (error) => this.log.error({ err: error }, 'an estimating worker broke down'));
    worker.on('exit', (code) => this.replace(slot, worker, code));
    worker.unref();
    return worker;
  }

  private take(slot: Slot, answer: EstimateAnswer): void {
    const job = slot.jobs.get(answer.id);
    if (job === undefined) return;
    slot.jobs.delete(answer.id);
    this.watch(slot);
    if (answer.ok) job.resolve(answer.result);
    else {
      this.log.error({ problem: answer.problem, layout: job.question.layoutId }, 'an estimate failed');
      this.askAgain(slot, job);
    }
  }

  private replace(slot: Slot, worker: Worker, code: number): void {
    if (slot.worker !== worker) return;
    slot.worker = null;
    clearTimeout(slot.watchdog);
    if (this.closed) return;
    const jobs = [...slot.jobs.values()];
    slot.jobs.clear();
    this.log.error({ code, open: jobs.length }, 'an estimating worker ended');
    // Only the first of them can have brought it down; the others have not been begun.
    jobs.forEach((job, index) => (index === 0 ? this.askAgain(slot, job) : this.ask(slot, job)));
  }

  private askAgain(slot: Slot, job: Job): void {
    if (job.attempt >= ATTEMPTS) {
      job.reject(new Error(`the estimate of layout ${job.question.layoutId} failed twice`));
      return;
    }
    job.attempt += 1;
    this.ask(slot, job);
  }

  // A worker that is given something and says nothing for too long is ended, which asks its questions again.
  private watch(slot: Slot): void {
    clearTimeout(slot.watchdog);
    if (slot.jobs.size === 0) return;
    slot.watchdog = setTimeout(() => void slot.worker?.terminate(), TOO_LONG_MS);
    slot.watchdog.unref();
  }
}

function countWorkers(): number {
  if (totalmem() < LITTLE_MEMORY_BYTES) return 1;
  return Math.max(1, Math.min(MOST_WORKERS, availableParallelism()));
}
