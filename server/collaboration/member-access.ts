import { actorOf, requireLoaded } from '../auth/signed-in';
import { Membership } from '../models/membership';
import type { Actor } from '../policies/policy';

const FRESH_MS = 3_000;

/** Who a socket acts for, as the membership is now. */
export interface CurrentMember {
  readonly actor: Actor;
  readonly name: string;
}

/** Current memberships, kept for a moment and forgotten as soon as one changes. */
export class MemberAccess {
  private readonly members = new Map<
    string,
    { readonly readAt: number; readonly member: Promise<CurrentMember | null> }
  >();

  /** The membership as it is now, or null when it was deactivated. */
  find(memberId: string): Promise<CurrentMember | null> {
    const kept = this.members.get(memberId);
    if (kept && performance.now() - kept.readAt < FRESH_MS) return kept.member;
    const member = readMember(memberId);
    const entry = { readAt: performance.now(), member };
    this.members.set(memberId, entry);
    member.catch(() => {
      if (this.members.get(memberId) === entry) this.members.delete(memberId);
    });
    return member;
  }

  /** Reads a membership anew the next time. */
  forget(memberId: string): void {
    this.members.delete(memberId);
  }
}

async function readMember(memberId: string): Promise<CurrentMember | null> {
  const found = await Membership.findByPk(memberId, { include: ['person', 'team'] });
  if (found === null || found.deactivatedAt !== null) return null;
  const membership = requireLoaded(found);
  return { actor: actorOf(membership), name: membership.person.name };
}
