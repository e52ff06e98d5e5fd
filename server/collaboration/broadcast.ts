import { assertNever } from '@/shared/errors';
import type { LiveEvent } from './live-layouts';
import { layoutRoom, type LiveServer } from './live-socket';

/** Sends the watchers of a layout what happened to it. */
export function broadcast(io: LiveServer, event: LiveEvent): void {
  const { layoutId } = event;
  const room = io.to(layoutRoom(layoutId));
  switch (event.kind) {
    case 'committed':
      for (const committed of event.committed) room.emit('operation', { layoutId, committed });
      return;
    case 'estimated':
      room.emit('estimate', { layoutId, ...event.estimate });
      return;
    case 'comment':
      // Written for each of them: what may be done with it differs.
      for (const socket of watchers(io, layoutId)) {
        socket.emit('comment', { layoutId, comment: event.present(socket.data.actor) });
      }
      return;
    case 'revision':
      for (const socket of watchers(io, layoutId)) {
        socket.emit('revision', { layoutId, revision: event.present(socket.data.actor) });
      }
      return;
    case 'layout-changed':
      room.emit('layout-changed', { layoutId });
      return;
    default:
      assertNever(event);
  }
}

function watchers(io: LiveServer, layoutId: string) {
  const ids = io.sockets.adapter.rooms.get(layoutRoom(layoutId)) ?? new Set<string>();
  return [...ids].flatMap((id) => io.sockets.sockets.get(id) ?? []);
}
