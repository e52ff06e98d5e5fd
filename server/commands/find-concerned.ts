import { Op, type Transaction, type WhereOptions } from 'sequelize';
import { actorOf, requireLoaded, type LoadedMembership } from '../auth/signed-in';
import { Membership } from '../models/membership';
import { OperationRow } from '../models/operation-row';
import { RevisionEvent } from '../models/revision-event';
import { Revision } from '../models/revision';
import type { Actor } from '../policies/policy';

const RECENTLY_MS = 30 * 24 * 60 * 60 * 1000;

/** Active members among these who may see what it is about, but for one. */
export async function findActiveMembers(
  where: WhereOptions<Membership['_attributes']>,
  options: { readonly but: string; readonly transaction: Transaction; maySee(actor: Actor): boolean },
): Promise<readonly LoadedMembership[]> {
  const memberships = await Membership.findAll({
    where: { [Op.and]: [where, { deactivatedAt: null, id: { [Op.ne]: options.but } }] },
    include: ['person', 'team'],
    transaction: options.transaction,
  });
  return memberships.map(requireLoaded).filter((membership) => options.maySee(actorOf(membership)));
}

/** Who works on a layout: those who changed it in the last thirty days, and those who saved or submitted a revision of it. */
export async function findLayoutWorkers(
  layoutId: string,
  transaction: Transaction,
): Promise<ReadonlySet<string>> {
  const since = new Date(Date.now() - RECENTLY_MS);
  const editors = await OperationRow.findAll({
    attributes: ['memberId'],
    where: { layoutId, committedAt: { [Op.gt]: since } },
    group: ['memberId'],
    raw: true,
    transaction,
  });
  const revisions = await Revision.findAll({
    attributes: ['id'],
    where: { layoutId },
    raw: true,
    transaction,
  });
  const submitters = await RevisionEvent.findAll({
    attributes: ['memberId'],
    where: { revisionId: revisions.map(({ id }) => id), kind: ['saved', 'submitted'] },
    group: ['memberId'],
    raw: true,
    transaction,
  });
  return new Set([...editors, ...submitters].map(({ memberId }) => memberId));
}
