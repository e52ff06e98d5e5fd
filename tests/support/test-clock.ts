import type { EditorClock } from '@/components/editor/editor-clock';

/** Time that stands still until a test moves it. */
export class TestClock implements EditorClock {
  private time = 0;
  private count = 0;
  private tasks: { readonly at: number; readonly order: number; readonly action: () => void }[] = [];

  now(): number {
    return this.time;
  }

  after(milliseconds: number, action: () => void): () => void {
    this.count += 1;
    const task = { at: this.time + milliseconds, order: this.count, action };
    this.tasks.push(task);
    return () => {
      this.tasks = this.tasks.filter((one) => one !== task);
    };
  }

  nextFrame(action: () => void): () => void {
    return this.after(16, action);
  }

  /** Lets time pass; everything that is due happens in its order, promises included. */
  async advance(milliseconds: number): Promise<void> {
    const end = this.time + milliseconds;
    await settlePromises();
    for (;;) {
      const [next] = this.tasks
        .filter((task) => task.at <= end)
        .sort((a, b) => a.at - b.at || a.order - b.order);
      if (!next) break;
      this.tasks = this.tasks.filter((task) => task !== next);
      this.time = next.at;
      next.action();
      await settlePromises();
    }
    this.time = end;
  }
}

/** Resumes after every promise that is settled already has been heard. */
function settlePromises(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}
