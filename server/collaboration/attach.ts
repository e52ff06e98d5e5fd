import type { IncomingMessage } from 'node:http';
import type { Session } from 'express-session';
import type { Server as SocketServer } from 'socket.io';
import type { SignedIn } from '../auth/signed-in';
import type { Services } from '../services';
import { broadcast } from './broadcast';
import { LayoutSocket } from './layout-socket';
import type { LiveServer, SocketData } from './live-socket';
import { MemberAccess } from './member-access';
import { PeopleHere } from './people-here';

/** The live part, as the server's start and stop see it. */
export interface Collaboration {
  /** Takes no more operations and waits until those that arrived are committed. */
  drain(): Promise<void>;
}

type HandshakeRequest = IncomingMessage & {
  readonly signedIn?: SignedIn;
  readonly sessionID?: string;
  readonly session?: Session;
};

/** Attaches the live part to the socket server, whose handshake carries the session already. */
export function attachCollaboration(server: SocketServer, services: Services): Collaboration {
  const io: LiveServer = server;
  const { live, log, revocation } = services;
  const access = new MemberAccess();
  const people = new PeopleHere();
  const phase = { stopping: false };

  io.use((socket, next) => {
    const data = readHandshake(socket.request);
    if (phase.stopping) return next(new Error('stopping'));
    if (data === null) return next(new Error('not-signed-in'));
    Object.assign(socket.data, data);
    next();
  });
  io.on('connection', (socket) => {
    void socket.join([`session:${socket.data.sessionId}`, `member:${socket.data.memberId}`]);
    new LayoutSocket(socket, { io, live, access, people, log, phase }).listen();
  });
  const stopListening = live.onEvent((event) => broadcast(io, event));
  const stopRevoking = revocation.onRevoke((room) => {
    if (room.startsWith('member:')) access.forget(room.slice('member:'.length));
    io.in(room).emit('refused', {
      code: 'not-signed-in',
      message: 'Your access changed. Sign in again to go on.',
    });
    io.in(room).disconnectSockets(true);
  });

  return {
    drain: async () => {
      phase.stopping = true;
      await live.drain();
      await live.close();
      stopListening();
      stopRevoking();
    },
  };
}

function readHandshake(request: HandshakeRequest): SocketData | null {
  const { signedIn, sessionID, session } = request;
  if (signedIn === undefined || sessionID === undefined) return null;
  const endsAt = session?.cookie.expires;
  return {
    memberId: signedIn.actor.memberId,
    sessionId: sessionID,
    sessionEndsAt: endsAt instanceof Date ? endsAt.getTime() : Infinity,
    actor: signedIn.actor,
    layoutId: null,
  };
}
