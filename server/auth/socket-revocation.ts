import { EventEmitter } from 'node:events';

/** A room of sockets that lost what let them in. */
export type RevokedRoom = `session:${string}` | `member:${string}`;

/**
 * Tells the live part which sockets to disconnect after sign-out, expiry, a new password or a changed role.
 * Sockets join `session:<session id>` and `member:<membership id>`.
 */
export class SocketRevocation {
  private readonly emitter = new EventEmitter();

  /** Calls the listener with every room that is to be disconnected; answers with the way to stop. */
  onRevoke(listener: (room: RevokedRoom) => void): () => void {
    this.emitter.on('revoke', listener);
    return () => this.emitter.off('revoke', listener);
  }

  /** Disconnects one browser's sockets. */
  revokeSession(sessionId: string): void {
    this.emitter.emit('revoke', `session:${sessionId}` satisfies RevokedRoom);
  }

  /** Disconnects every socket of a membership. */
  revokeMember(memberId: string): void {
    this.emitter.emit('revoke', `member:${memberId}` satisfies RevokedRoom);
  }
}
