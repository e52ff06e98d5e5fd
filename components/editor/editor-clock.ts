/** Time as the editor needs it; an argument, so that tests own it. */
export interface EditorClock {
  /** Milliseconds since some fixed moment. */
  now(): number;
  /** Calls once after a delay; returns how to call it off. */
  after(milliseconds: number, action: () => void): () => void;
  /** Calls once before the next painting; returns how to call it off. */
  nextFrame(action: () => void): () => void;
}

/** The real clock of a browser (frames by timer where there is no painting). */
export function createSystemClock(): EditorClock {
  return {
    now: () => Date.now(),
    after(milliseconds, action) {
      const timer = setTimeout(action, milliseconds);
      return () => clearTimeout(timer);
    },
    nextFrame(action) {
      if (typeof requestAnimationFrame !== 'function') return this.after(16, action);
      const frame = requestAnimationFrame(action);
      return () => cancelAnimationFrame(frame);
    },
  };
}
