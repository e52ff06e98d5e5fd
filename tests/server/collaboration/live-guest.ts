import { io, type Socket } from 'socket.io-client';
import type { Membership } from '@/server/models/membership';
import { Person } from '@/server/models/person';
import type { ClientEvents, JoinAnswer, OperationAnswer, ServerEvents } from '@/shared/api/live';
import { createId } from '@/shared/ids';
import { DOCUMENT_VERSION } from '@/shared/layout/document';
import type { Change, CommittedOperation, Operation } from '@/shared/layout/operation';
import { TEST_PASSWORD } from '../../support/factories';
import type { TestServer } from '../../support/test-server';

/** The session's cookie of a member who signs in. */
export async function signInCookie(server: TestServer, membership: Membership): Promise<string> {
  const { email } = await Person.findByPk(membership.personId, { rejectOnEmpty: true });
  const response = await fetch(`${server.url}/api/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: server.url },
    body: JSON.stringify({ email, password: TEST_PASSWORD }),
  });
  if (response.status !== 200) throw new Error(`signing in was answered ${response.status}`);
  return response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');
}

/** A change of fields of an antenna, as an operation with an id of its own. */
export function setAntenna(id: string, fields: Record<string, unknown>): Operation {
  const change = { kind: 'set', collection: 'antennas', id, fields } as Change;
  return { id: createId(), version: DOCUMENT_VERSION, changes: [change] };
}

/** One real socket to a test's server. */
export class LiveGuest {
  readonly committed: CommittedOperation[] = [];

  private constructor(readonly socket: Socket<ServerEvents, ClientEvents>) {
    socket.on('operation', ({ committed }) => this.committed.push(committed));
  }

  /** Connects with a cookie; @throws Error with the code of the refusal as its message. */
  static async connect(server: TestServer, cookie: string, origin = server.url): Promise<LiveGuest> {
    const socket = io(server.url, {
      transports: ['websocket'],
      forceNew: true,
      reconnection: false,
      extraHeaders: { cookie, origin },
    });
    const guest = new LiveGuest(socket);
    try {
      await new Promise<void>((resolve, reject) => {
        socket.once('connect', resolve);
        socket.once('connect_error', reject);
      });
    } catch (error) {
      socket.disconnect();
      throw error;
    }
    return guest;
  }

  join(
    layoutId: string,
    after: number | null = null,
    version: number = DOCUMENT_VERSION,
  ): Promise<JoinAnswer> {
    return this.socket.emitWithAck('join', { layoutId, after, version });
  }

  send(layoutId: string, operation: Operation): Promise<OperationAnswer> {
    return this.socket.emitWithAck('operation', { layoutId, operation });
  }

  /** The next message of an event that a test looks for. */
  next<E extends keyof ServerEvents>(
    event: E,
    matches: (message: Parameters<ServerEvents[E]>[0]) => boolean = () => true,
  ): Promise<Parameters<ServerEvents[E]>[0]> {
    return new Promise((resolve) => {
      const listener = (message: Parameters<ServerEvents[E]>[0]) => {
        if (!matches(message)) return;
        this.socket.off(event, listener as never);
        resolve(message);
      };
      this.socket.on(event, listener as never);
    });
  }

  /** Resolves with the refusal's code that was said before the server hung up, null when none was. */
  hungUp(): Promise<string | null> {
    let code: string | null = null;
    this.socket.once('refused', (refusal) => (code = refusal.code));
    return new Promise((resolve) => this.socket.once('disconnect', () => resolve(code)));
  }

  /** Sends what the types forbid. */
  sendRaw(event: string, ...content: unknown[]): void {
    (this.socket as unknown as Socket).emit(event, ...content);
  }

  /** Asks with what the types forbid. */
  askRaw(event: string, content: unknown): Promise<OperationAnswer> {
    return (this.socket as unknown as Socket).emitWithAck(event, content) as Promise<OperationAnswer>;
  }
}
