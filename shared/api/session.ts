import { z } from 'zod';
import {
  emailField,
  enteredPasswordField,
  idField,
  nameField,
  passwordField,
  roleField,
  rolesField,
  timeField,
  tokenField,
  abilitiesOf,
} from './fields';

/** GET /api/setup: what the sign-in screen offers. */
export const setupSchema = z.strictObject({
  state: z.enum(['first-visit', 'ready']),
  demo: z.boolean(),
  demoAccounts: z.array(
    z.strictObject({ name: z.string(), email: z.string(), password: z.string(), roles: z.array(roleField) }),
  ),
});
export type Setup = z.infer<typeof setupSchema>;

/** POST /api/setup: the first visitor makes a team and its administrator. Answers with the session. */
export const firstVisitRequest = z.strictObject({
  code: z.string().trim().min(1, 'is empty').max(100),
  team: nameField,
  name: nameField,
  email: emailField,
  password: passwordField,
});

/** POST /api/session */
export const signInRequest = z.strictObject({ email: emailField, password: enteredPasswordField });

/** PATCH /api/session: another team of mine. */
export const switchTeamRequest = z.strictObject({ teamId: idField });

/**
 * GET /api/session (401 when not signed in), POST /api/session, POST /api/setup ...
 * DELETE /api/session signs out (204), DELETE /api/sessions signs out everywhere (204).
 */
export const sessionSchema = z.strictObject({
  person: z.strictObject({ id: idField, name: z.string(), email: z.string() }),
  /** The membership in the current team. */
  member: z.strictObject({ id: idField, name: z.string(), initials: z.string(), roles: z.array(roleField) }),
  team: z.strictObject({ id: idField, name: z.string() }),
  teams: z.array(z.strictObject({ id: idField, name: z.string() })),
  demo: z.boolean(),
  abilities: abilitiesOf(['seeJobs', 'createJob', 'editParts', 'administer', 'seeMails']),
});
export type Session = z.infer<typeof sessionSchema>;

/** PATCH /api/account */
export const accountRequest = z.strictObject({ name: nameField });

/** PUT /api/account/password: signs out all other sessions. */
export const changePasswordRequest = z.strictObject({
  currentPassword: enteredPasswordField,
  password: passwordField,
});

/** POST /api/passwords/forgotten: the same 202 whether the account exists or not. */
export const forgottenPasswordRequest = z.strictObject({ email: emailField });

/** POST /api/passwords: sets a new password by the token of a link (204). GET /api/passwords/:token tells whether it holds. */
export const newPasswordRequest = z.strictObject({ token: tokenField, password: passwordField });
export const passwordTokenSchema = z.strictObject({ email: z.string() });

/** GET /api/members */
export const memberSchema = z.strictObject({
  id: idField,
  name: z.string(),
  email: z.string(),
  initials: z.string(),
  roles: z.array(roleField),
  active: z.boolean(),
  isYou: z.boolean(),
  abilities: abilitiesOf(['changeRoles', 'deactivate']),
});
export type Member = z.infer<typeof memberSchema>;
export const memberListSchema = z.strictObject({ items: z.array(memberSchema) });

/** PATCH /api/members/:id */
export const memberChangeRequest = z
  .strictObject({ roles: rolesField.optional(), active: z.boolean().optional() })
  .refine((change) => change.roles !== undefined || change.active !== undefined, 'changes nothing');

/** POST /api/invitations, GET /api/invitations, DELETE /api/invitations/:id, POST /api/invitations/:id/send (again) */
export const invitationRequest = z.strictObject({ email: emailField, roles: rolesField });
export const invitationSchema = z.strictObject({
  id: idField,
  email: z.string(),
  roles: z.array(roleField),
  invitedBy: z.string(),
  createdAt: timeField,
  expiresAt: timeField,
});
export type Invitation = z.infer<typeof invitationSchema>;
export const invitationListSchema = z.strictObject({ items: z.array(invitationSchema) });

/** GET /api/invitations/by-token/:token */
export const invitationTokenSchema = z.strictObject({
  email: z.string(),
  team: z.string(),
  roles: z.array(roleField),
  /** An account exists already: its password is asked for instead of a new one. */
  hasAccount: z.boolean(),
});

/** POST /api/invitations/accept: answers with the session. */
export const acceptInvitationRequest = z.strictObject({
  token: tokenField,
  name: nameField.optional(),
  password: enteredPasswordField,
});

/** GET /api/mails (while the demo is on) */
export const mailSchema = z.strictObject({
  id: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  receivedAt: timeField,
});
export type Mail = z.infer<typeof mailSchema>;
export const mailListSchema = z.strictObject({ items: z.array(mailSchema) });
