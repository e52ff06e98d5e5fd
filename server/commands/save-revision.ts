import type { Transaction } from 'sequelize';
import type { SignedIn } from '../auth/signed-in';
import { transact } from '../database/transaction';
import { Layout } from '../models/layout';
import { Revision } from '../models/revision';
import { RevisionEvent } from '../models/revision-event';
import type { Services } from '../services';
import type { Estimate } from '@/shared/estimate/estimate-result';
import { canonicalJson, revisionHash } from '@/shared/layout/revision-hash';
import { nextRevisionLetter, revisionNumber } from '@/shared/layout/revision-letters';
import type { LayoutState } from './commit-operations';
import { loadRevision } from './load-revision';

/** What a revision is made of; the results belong to the document and were computed before. */
export interface RevisionInput {
  readonly state: LayoutState;
  readonly results: Estimate;
  readonly note: string;
  readonly names: { readonly job: string; readonly platform: string; readonly layout: string };
}

/** Who saves. */
export interface Saver {
  readonly teamId: string;
  readonly memberId: string;
  readonly memberName: string;
}

/**
 * Saves a state of a layout under the next letter, with its canonical JSON and the SHA-256 of that, in one
 * transaction that holds the layout's row: letters have no gap and none is given twice.
 */
export async function saveRevision(
  services: Services,
  by: SignedIn,
  layoutId: string,
  input: RevisionInput,
): Promise<Revision> {
  const { teamId, memberId } = by.actor;
  const saver = { teamId, memberId, memberName: by.person.name };
  return transact(services.sequelize, (transaction) => writeRevision(saver, layoutId, input, transaction));
}

/** Like `saveRevision`, within a transaction that does more. */
export async function writeRevision(
  { teamId, memberId, memberName }: Saver,
  layoutId: string,
  { state, results, note, names }: RevisionInput,
  transaction: Transaction,
): Promise<Revision> {
  await Layout.findByPk(layoutId, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
  const letter = nextRevisionLetter(await findLastLetter(layoutId, transaction));
  const { solverVersion } = results;
  const content = { layoutId, letter, document: state.document, results, solverVersion };
  const now = new Date();
  const revision = await Revision.create(
    {
      teamId,
      layoutId,
      letter,
      hash: revisionHash(content),
      content: canonicalJson(content),
      sequence: state.sequence,
      note,
      jobName: names.job,
      platformName: names.platform,
      layoutName: names.layout,
      savedById: memberId,
      savedByName: memberName,
      savedAt: now,
    },
    { transaction },
  );
  await RevisionEvent.create(
    { revisionId: revision.id, kind: 'saved', memberId, memberName, at: now },
    { transaction },
  );
  return loadRevision(teamId, revision.id, transaction);
}

/** The letter of a layout's newest revision, null before the first. */
export async function findLastLetter(layoutId: string, transaction?: Transaction): Promise<string | null> {
  const rows = await Revision.findAll({
    attributes: ['letter'],
    where: { layoutId },
    raw: true,
    ...(transaction ? { transaction } : {}),
  });
  return rows.reduce<string | null>(
    (last, { letter }) => (last === null || revisionNumber(letter) > revisionNumber(last) ? letter : last),
    null,
  );
}
