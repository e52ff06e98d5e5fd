import { io, type Socket } from 'socket.io-client';
import { operationListSchema } from '@/shared/api/layouts';
import type { ClientEvents, ServerEvents } from '@/shared/api/live';
import { ERROR_STATUS, type ErrorCode, type Refusal } from '@/shared/errors';
import { ApiProblem, Unreachable } from './api-problem';
import {
  LOST,
  type EditorTransport,
  type LiveEvent,
  type Lost,
  type MissedOperations,
} from './live-transport';
import { request } from './request';
import { renewSession } from './session-renewal';

/** No answer for this long is taken for a lost one; the operation is sent again with its id. */
const ANSWER_TIMEOUT_MS = 8000;
/** Wait before knocking again at a server that hung up. */
const KNOCK_AGAIN_MS = 1500;

type LiveSocket = Socket<ServerEvents, ClientEvents>;

export type LiveTransportOptions = {
  /** Where the server is; this page's own origin when left out. */
  readonly url?: string;
  readonly extraHeaders?: Record<string, string>;
};

/** The line to the server over Socket.IO, with the session's cookie. One for each open layout. */
export function createLiveTransport(options: LiveTransportOptions = {}): EditorTransport {
  const socket: LiveSocket = io(options.url ?? '', {
    autoConnect: false,
    // One line for each open layout: a socket watches at most one at a time.
    forceNew: true,
    transports: ['websocket', 'polling'],
    reconnectionDelay: 500,
    reconnectionDelayMax: 5000,
    ...(options.extraHeaders ? { extraHeaders: options.extraHeaders } : {}),
  });
  return new LiveLine(socket);
}

class LiveLine implements EditorTransport {
  private readonly listeners = new Set<(event: LiveEvent) => void>();
  private isWanted = false;
  private knock: ReturnType<typeof setTimeout> | null = null;

  constructor(private readonly socket: LiveSocket) {
    socket.on('connect', () => this.tell({ kind: 'connected', socketId: socket.id ?? '' }));
    socket.on('disconnect', (reason) => {
      this.tell({ kind: 'disconnected' });
      // The library comes back by itself only when it was not the server that hung up.
      if (reason === 'io server disconnect') this.knockAgain();
    });
    socket.on('connect_error', (error) => this.failToConnect(error));
    socket.on('operation', (message) => this.tell({ kind: 'operation', ...message }));
    socket.on('nudge', (message) => this.tell({ kind: 'nudge', ...message }));
    socket.on('presence', (message) => this.tell({ kind: 'presence', ...message }));
    socket.on('people', (message) => this.tell({ kind: 'people', ...message }));
    socket.on('estimate', (message) => this.tell({ kind: 'estimate', ...message }));
    socket.on('comment', (message) => this.tell({ kind: 'comment', ...message }));
    socket.on('revision', (message) => this.tell({ kind: 'revision', ...message }));
    socket.on('layout-changed', (message) => this.tell({ kind: 'layout-changed', ...message }));
    socket.on('refused', (refusal) => this.tell({ kind: 'refused', refusal }));
  }

  connect(): void {
    this.isWanted = true;
    this.socket.connect();
  }

  disconnect(): void {
    this.isWanted = false;
    if (this.knock) clearTimeout(this.knock);
    this.knock = null;
    this.socket.disconnect();
  }

  join(question: Parameters<EditorTransport['join']>[0]): ReturnType<EditorTransport['join']> {
    return this.ask((answer) => this.socket.timeout(ANSWER_TIMEOUT_MS).emit('join', question, answer));
  }

  sendOperation(
    ...[layoutId, operation]: Parameters<EditorTransport['sendOperation']>
  ): ReturnType<EditorTransport['sendOperation']> {
    return this.ask((answer) =>
      this.socket.timeout(ANSWER_TIMEOUT_MS).emit('operation', { layoutId, operation }, answer),
    );
  }

  async fetchOperations(layoutId: string, after: number): Promise<MissedOperations | Lost> {
    try {
      const path = `/api/layouts/${layoutId}/operations?after=${after}`;
      const { items, sequence } = await request('GET', path, { schema: operationListSchema });
      return { ok: true, items, sequence };
    } catch (error) {
      // Whoever asked tries again while the line stands; a member who is no longer let in is told by the line.
      if (error instanceof Unreachable || error instanceof ApiProblem) return LOST;
      throw error;
    }
  }

  nudge(message: Parameters<EditorTransport['nudge']>[0]): void {
    if (!this.socket.connected) return;
    // The end of a gesture must arrive; one place on its way may get lost.
    if (message.done) this.socket.emit('nudge', message);
    else this.socket.volatile.emit('nudge', message);
  }

  presence(message: Parameters<EditorTransport['presence']>[0]): void {
    if (this.socket.connected) this.socket.volatile.emit('presence', message);
  }

  listen(listener: (event: LiveEvent) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  /** A question while the line is down would wait in the library and arrive out of order: it is lost at once. */
  private ask<T>(emit: (answer: (error: Error | null, value: T) => void) => void): Promise<T | Lost> {
    if (!this.socket.connected) return Promise.resolve(LOST);
    return new Promise((resolve) => emit((error, value) => resolve(error ? LOST : value)));
  }

  private tell(event: LiveEvent): void {
    for (const listener of [...this.listeners]) listener(event);
  }

  private failToConnect(error: Error): void {
    this.tell({ kind: 'disconnected' });
    const refusal = refusalOf(error);
    if (!refusal) return;
    this.tell({ kind: 'refused', refusal });
    if (refusal.code === 'not-signed-in') void this.renew();
    else if (!this.socket.active) this.knockAgain();
  }

  private async renew(): Promise<void> {
    if ((await renewSession()) && this.isWanted) this.socket.connect();
  }

  private knockAgain(): void {
    if (!this.isWanted || this.knock) return;
    this.knock = setTimeout(() => {
      this.knock = null;
      if (this.isWanted && !this.socket.connected) this.socket.connect();
    }, KNOCK_AGAIN_MS);
  }
}

/** The refusal of a handshake, which carries its code as the message; null when the server was not reached. */
function refusalOf({ message: code }: Error): Refusal | null {
  if (!Object.hasOwn(ERROR_STATUS, code)) return null;
  const message =
    code === 'not-signed-in'
      ? 'Your session ended. Sign in again to go on.'
      : 'The server cannot take you in.';
  return { code: code as ErrorCode, message };
}
