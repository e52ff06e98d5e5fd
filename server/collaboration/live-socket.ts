import type { DefaultEventsMap, Server, Socket } from 'socket.io';
import type { ClientEvents, ServerEvents } from '@/shared/api/live';
import type { Actor } from '../policies/policy';

/** What is known of a socket from its handshake. */
export interface SocketData {
  readonly memberId: string;
  readonly sessionId: string;
  /** When the session ends, milliseconds since 1970. */
  readonly sessionEndsAt: number;
  /** The membership as it was last looked at. */
  actor: Actor;
  /** The layout that the socket watches. */
  layoutId: string | null;
}

/** The socket server with our events. */
export type LiveServer = Server<ClientEvents, ServerEvents, DefaultEventsMap, SocketData>;

/** A socket with our events. */
export type LiveSocket = Socket<ClientEvents, ServerEvents, DefaultEventsMap, SocketData>;

/** The room of those who watch a layout. */
export function layoutRoom(layoutId: string): string {
  return `layout:${layoutId}`;
}
