import type { Sequelize } from 'sequelize';
import { AuditEntry } from './audit-entry';
import { CaughtMail } from './caught-mail';
import { CommentReplyRow } from './comment-reply-row';
import { CommentRow } from './comment-row';
import { Invitation } from './invitation';
import { Job } from './job';
import { Layout } from './layout';
import { Membership } from './membership';
import { OperationRow } from './operation-row';
import { Part } from './part';
import { PasswordReset } from './password-reset';
import { Person } from './person';
import { Platform } from './platform';
import { Revision } from './revision';
import { RevisionEvent } from './revision-event';
import { SessionRecord } from './session-record';
import { Task } from './task';
import { Team } from './team';

// In the order of their associations: what is pointed to comes first.
const MODELS: readonly { bindTo(sequelize: Sequelize): void }[] = [
  Team,
  Person,
  Membership,
  SessionRecord,
  Invitation,
  PasswordReset,
  AuditEntry,
  Task,
  CaughtMail,
  Job,
  Platform,
  Layout,
  OperationRow,
  Part,
  RevisionEvent,
  Revision,
  CommentReplyRow,
  CommentRow,
];

/** Binds every model to the application's connection. */
export function bindModels(sequelize: Sequelize): void {
  for (const model of MODELS) model.bindTo(sequelize);
}
