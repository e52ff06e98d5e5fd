import { Layout } from '../models/layout';
import { decodeDocument } from '../models/document-codec';
import { Platform } from '../models/platform';
import { LayoutWriter, type WriterContext } from './layout-writer';

const IDLE_MS = 2 * 60_000;
const SWEEP_MS = 30_000;

/** The writers of all open layouts: made when first asked for, let go when nobody has used them for a while. */
export class LayoutWriters {
  private readonly writers = new Map<string, Promise<LayoutWriter>>();
  private readonly sweep: NodeJS.Timeout;

  constructor(private readonly context: WriterContext) {
    this.sweep = setInterval(() => void this.evictIdle(), SWEEP_MS);
    this.sweep.unref();
  }

  /**
   * The writer of a layout.
   * @throws Error when there is no such layout.
   */
  open(layoutId: string): Promise<LayoutWriter> {
    const open = this.writers.get(layoutId);
    if (open) return open;
    const loading = this.load(layoutId);
    this.writers.set(layoutId, loading);
    loading.catch(() => this.writers.delete(layoutId));
    return loading;
  }

  /** How many layouts are open. */
  get size(): number {
    return this.writers.size;
  }

  /** Lets go of the writers that were not used for a while. */
  async evictIdle(idleMs = IDLE_MS): Promise<void> {
    for (const [layoutId, opening] of this.writers) {
      const writer = await opening.then(
        (opened) => opened,
        () => null,
      );
      if (writer !== null && writer.idleMs >= idleMs) this.writers.delete(layoutId);
    }
  }

  /** Waits until everything that arrived is committed or refused. */
  async drain(): Promise<void> {
    clearInterval(this.sweep);
    const opened = await Promise.allSettled(this.writers.values());
    for (const result of opened) if (result.status === 'fulfilled') await result.value.drain();
  }

  private async load(layoutId: string): Promise<LayoutWriter> {
    const layout = await Layout.findByPk(layoutId, { rejectOnEmpty: true });
    const platform = await Platform.findByPk(layout.platformId, {
      attributes: ['jobId'],
      rejectOnEmpty: true,
    });
    const state = { document: decodeDocument(layout.document), sequence: layout.sequence };
    return new LayoutWriter(layoutId, platform.jobId, state, this.context);
  }
}
