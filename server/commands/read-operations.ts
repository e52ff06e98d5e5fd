import { Op } from 'sequelize';
import { OperationRow } from '../models/operation-row';
import type { CommittedOperation } from '@/shared/layout/operation';

/** The operations of a layout after one sequence number up to another, in their order. */
export async function readOperations(
  layoutId: string,
  after: number,
  upTo: number,
): Promise<CommittedOperation[]> {
  if (after >= upTo) return [];
  const rows = await OperationRow.findAll({
    where: { layoutId, sequence: { [Op.gt]: after, [Op.lte]: upTo } },
    order: ['sequence'],
  });
  return rows.map((row) => row.toCommitted());
}
