import type { Transaction } from 'sequelize';
import type { SignedIn } from '../auth/signed-in';
import { transact } from '../database/transaction';
import { writeDecision, writeSubmitted, type LayoutNames } from '../mail/review-messages';
import { Layout } from '../models/layout';
import { Revision } from '../models/revision';
import { RevisionEvent, type RevisionEventKind } from '../models/revision-event';
import { findEvent, stateOf } from '../models/revision-state';
import { can, decide, explainRefusal, type Action } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import type { Services } from '../services';
import { enqueueTask } from '../tasks/enqueue-task';
import type { RevisionState } from '@/shared/api/jobs';
import { accept, refuse, type Refusal, type Result } from '@/shared/errors';
import { revisionNumber } from '@/shared/layout/revision-letters';
import { findActiveMembers } from './find-concerned';
import { loadRevision } from './load-revision';

type Deciding = Extract<Action, 'submit-revision' | 'return-revision' | 'freeze-revision'>;

interface Step {
  readonly action: Deciding;
  readonly from: RevisionState;
  readonly event: RevisionEventKind;
}

const STEPS: Readonly<Record<Deciding, Step>> = {
  'submit-revision': { action: 'submit-revision', from: 'saved', event: 'submitted' },
  'return-revision': { action: 'return-revision', from: 'in review', event: 'returned' },
  'freeze-revision': { action: 'freeze-revision', from: 'in review', event: 'frozen' },
};

/** Submits a saved revision for review, and writes to the team's approvers. */
export async function submitRevision(
  services: Services,
  by: SignedIn,
  revisionId: string,
): Promise<Result<Revision>> {
  return takeStep(services, by, revisionId, 'submit-revision', null, async (revision, transaction) => {
    const approvers = await findActiveMembers(
      { teamId: by.actor.teamId },
      {
        but: by.actor.memberId,
        transaction,
        maySee: (actor) =>
          can(actor, 'freeze-revision', { ...revisionRecord(revision), submittedById: null }),
      },
    );
    const message = writeSubmitted({
      names: namesOf(revision),
      letter: revision.letter,
      by: by.person.name,
      link: linkOf(services, revision),
    });
    for (const { person } of approvers) {
      await enqueueTask('mail', { to: person.email, ...message }, { transaction, teamId: revision.teamId });
    }
    return null;
  });
}

/** Returns a revision in review with a reason; that letter is finished, the next one is saved. */
export async function returnRevision(
  services: Services,
  by: SignedIn,
  revisionId: string,
  reason: string,
): Promise<Result<Revision>> {
  return takeStep(services, by, revisionId, 'return-revision', reason, async (revision, transaction) => {
    await writeToSubmitter(services, by, revision, 'returned', reason, transaction);
    return null;
  });
}

/**
 * Freezes a revision in review: approver, time, meaning and reason in one transaction, in which the layout's
 * former frozen revision becomes superseded. The password was checked before.
 */
export async function freezeRevision(
  services: Services,
  by: SignedIn,
  revisionId: string,
  reason: string,
): Promise<Result<Revision>> {
  return takeStep(services, by, revisionId, 'freeze-revision', reason, async (revision, transaction) => {
    const all = await Revision.findAll({
      where: { layoutId: revision.layoutId },
      attributes: { exclude: ['content'] },
      include: ['events'],
      transaction,
    });
    const former = all.filter((other) => other.id !== revision.id && stateOf(other) === 'frozen');
    const later = former.find((other) => revisionNumber(other.letter) > revisionNumber(revision.letter));
    if (later) {
      return { code: 'wrong-state', message: `The later revision ${later.letter} is frozen already.` };
    }
    for (const other of former) await addEvent(other.id, 'superseded', by, null, transaction);
    await writeToSubmitter(services, by, revision, 'frozen', reason, transaction);
    return null;
  });
}

/**
 * One step of a revision's life. The rows of the layout and of the revision are locked, so that two people
 * cannot both decide; policy and state are looked at under that lock. `follow` refuses before it writes anything.
 */
async function takeStep(
  services: Services,
  by: SignedIn,
  revisionId: string,
  action: Deciding,
  reason: string | null,
  follow: (revision: Revision, transaction: Transaction) => Promise<Refusal | null>,
): Promise<Result<Revision>> {
  const { teamId } = by.actor;
  const step = STEPS[action];
  return transact(services.sequelize, async (transaction) => {
    const { layoutId } = await loadRevision(teamId, revisionId, transaction);
    await Layout.findByPk(layoutId, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
    await Revision.findByPk(revisionId, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
    const revision = await loadRevision(teamId, revisionId, transaction);
    const decision = decide(by.actor, action, revisionRecord(revision));
    if (decision !== 'allowed') return refuse<Revision>(decision, explainRefusal(decision));
    const state = stateOf(revision);
    if (state !== step.from) {
      return refuse<Revision>('wrong-state', `Revision ${revision.letter} is ${state}, not ${step.from}.`);
    }
    const refusal = await follow(revision, transaction);
    if (refusal) return { ok: false, refusal };
    await addEvent(revisionId, step.event, by, reason, transaction);
    return accept(await loadRevision(teamId, revisionId, transaction));
  });
}

async function addEvent(
  revisionId: string,
  kind: RevisionEventKind,
  by: SignedIn,
  reason: string | null,
  transaction: Transaction,
): Promise<void> {
  await RevisionEvent.create(
    { revisionId, kind, memberId: by.actor.memberId, memberName: by.person.name, reason, at: new Date() },
    { transaction },
  );
}

async function writeToSubmitter(
  services: Services,
  by: SignedIn,
  revision: Revision,
  decision: 'returned' | 'frozen',
  reason: string,
  transaction: Transaction,
): Promise<void> {
  const submitterId = findEvent(revision, 'submitted')?.memberId;
  if (submitterId === undefined) throw new Error(`nobody submitted revision ${revision.id}`);
  const submitters = await findActiveMembers(
    { id: submitterId },
    { but: by.actor.memberId, transaction, maySee: () => true },
  );
  const message = writeDecision({
    names: namesOf(revision),
    letter: revision.letter,
    decision,
    by: by.person.name,
    reason,
    link: linkOf(services, revision),
  });
  for (const { person } of submitters) {
    await enqueueTask('mail', { to: person.email, ...message }, { transaction, teamId: revision.teamId });
  }
}

function namesOf(revision: Revision): LayoutNames {
  return { job: revision.jobName, platform: revision.platformName, layout: revision.layoutName };
}

function linkOf(services: Services, revision: Revision): string {
  return `${services.baseUrl()}/r/${revision.id}`;
}
