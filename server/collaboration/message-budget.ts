/** Most messages of a kind that one socket may send in a second. */
export const MESSAGE_LIMITS = { operation: 60, volatile: 240 } as const;

/** What is counted: what asks for an answer, and what may be lost. */
export type MessageKind = keyof typeof MESSAGE_LIMITS;

const WINDOW_MS = 1000;

/** Counts one socket's messages over the last second. */
export class MessageBudget {
  private readonly times: Record<MessageKind, number[]> = { operation: [], volatile: [] };

  /** Takes one message at a time in milliseconds; false when it is one too many. */
  take(kind: MessageKind, nowMs: number): boolean {
    const times = this.times[kind];
    while (times.length > 0 && (times[0] as number) <= nowMs - WINDOW_MS) times.shift();
    times.push(nowMs);
    return times.length <= MESSAGE_LIMITS[kind];
  }
}
