import type { Role } from '@/shared/api/fields';

/** A role and what it is for. */
export const ROLE_WORDS: Readonly<Record<Role, { readonly name: string; readonly does: string }>> = {
  administrator: { name: 'Administrator', does: 'invites people, gives roles, keeps the parts' },
  integrator: { name: 'Integrator', does: 'surveys, places, submits for review' },
  reviewer: { name: 'Reviewer', does: 'watches and comments' },
  approver: { name: 'Approver', does: 'freezes or returns revisions' },
  installer: { name: 'Installer', does: 'builds from frozen revisions' },
};

/** Roles in a line: Integrator, reviewer. */
export function rolesText(roles: readonly Role[]): string {
  const names = roles.map((role) => ROLE_WORDS[role].name.toLowerCase()).join(', ');
  return names.charAt(0).toUpperCase() + names.slice(1);
}
