import type { Server as SocketServer } from 'socket.io';
import type { Services } from '../services';

/** The live part, as the server's start and stop see it. */
export interface Collaboration {
  /** Takes no more operations and waits until those that arrived are committed. */
  drain(): Promise<void>;
}

/** Attaches the live part to the socket server, whose handshake carries the session already. */
export function attachCollaboration(_io: SocketServer, _services: Services): Collaboration {
  return { drain: () => Promise.resolve() };
}
