import type { Invitation as InvitationRow } from '../models/invitation';
import type { Invitation } from '@/shared/api/session';

/** An open invitation, as an administrator sees it. */
export function presentInvitation(invitation: InvitationRow, invitedBy: string): Invitation {
  return {
    id: invitation.id,
    email: invitation.email,
    roles: [...invitation.roles],
    invitedBy,
    createdAt: invitation.createdAt.toISOString(),
    expiresAt: invitation.expiresAt.toISOString(),
  };
}
