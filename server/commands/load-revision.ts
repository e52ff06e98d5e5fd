import type { Transaction } from 'sequelize';
import { Revision } from '../models/revision';
import { readRevisionContent, type StoredRevisionContent } from '../models/revision-content';

/** A revision of a team with what happened to it, without its content; or null. */
export function findRevision(
  teamId: string,
  id: string,
  transaction?: Transaction,
): Promise<Revision | null> {
  return Revision.findOne({
    where: { id, teamId },
    attributes: { exclude: ['content'] },
    include: ['events'],
    ...(transaction ? { transaction } : {}),
  });
}

/**
 * Like `findRevision`, for one that is known to be there.
 * @throws Error when it is not.
 */
export async function loadRevision(teamId: string, id: string, transaction?: Transaction): Promise<Revision> {
  const revision = await findRevision(teamId, id, transaction);
  if (revision === null) throw new Error(`revision ${id} is gone`);
  return revision;
}

/**
 * What the canonical JSON of a revision holds.
 * @throws Error when there is no such revision.
 */
export async function loadContent(id: string): Promise<StoredRevisionContent> {
  const { content } = await Revision.findByPk(id, { attributes: ['content'], rejectOnEmpty: true });
  return readRevisionContent(content);
}

/** A layout's revisions with what happened to them, newest first. */
export async function listRevisions(layoutIds: readonly string[]): Promise<readonly Revision[]> {
  if (layoutIds.length === 0) return [];
  return Revision.findAll({
    where: { layoutId: [...layoutIds] },
    attributes: { exclude: ['content'] },
    include: ['events'],
    order: [
      ['savedAt', 'DESC'],
      ['sequence', 'DESC'],
      ['letter', 'DESC'],
    ],
  });
}
