import { Op, QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { transact } from '../database/transaction';
import { Layout } from '../models/layout';
import { decodeDocument, encodeDocument } from '../models/document-codec';
import { OperationRow } from '../models/operation-row';
import { accept, refuse, type Result } from '@/shared/errors';
import type { LayoutDocument } from '@/shared/layout/document';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';
import { applyOperation } from '@/shared/layout/operations';
import { touchJob } from './touch-job';

/** A layout after its first `sequence` operations. */
export interface LayoutState {
  readonly document: LayoutDocument;
  readonly sequence: number;
}

/** An operation that waits for its place, and who sent it. */
export interface OperationEntry {
  readonly operation: Operation;
  /** JSON of its changes. */
  readonly changesText: string;
  readonly memberId: string;
  readonly memberName: string;
}

/** What became of a batch. */
export interface CommitOutcome {
  readonly state: LayoutState;
  /** One for each entry, in their order: the sequence it was committed with, or why not. */
  readonly answers: readonly Result<number>[];
  readonly committed: readonly CommittedOperation[];
}

interface Applied extends CommitOutcome {
  /** JSON of the committed operations' changes, in their order. */
  readonly texts: readonly string[];
}

/** What a batch is committed to. */
export interface CommitTarget {
  readonly layoutId: string;
  /** The state as it was last seen; read anew when the layout has moved on elsewhere, or when it is null. */
  readonly known: LayoutState | null;
  /** The job whose time of change is moved on, if that is due. */
  readonly touchedJobId: string | null;
}

/**
 * Gives operations their places in the one order of a layout, in one transaction: all that hold are committed
 * in the order they came, together with the document they make; the others are refused. An operation that has
 * its place already is answered with it.
 */
export async function commitOperations(
  sequelize: Sequelize,
  target: CommitTarget,
  entries: readonly OperationEntry[],
): Promise<CommitOutcome> {
  return transact(sequelize, async (transaction) => {
    const before = await lockState(sequelize, target, transaction);
    const places = await findPlaces(target.layoutId, entries, transaction);
    const outcome = applyEntries(target.layoutId, before, entries, places, new Date());
    if (outcome.committed.length > 0) await write(target, outcome, transaction);
    return outcome;
  });
}

async function lockState(
  sequelize: Sequelize,
  target: CommitTarget,
  transaction: Transaction,
): Promise<LayoutState> {
  const [row] = await sequelize.query<{ sequence: number }>(
    'SELECT sequence FROM layouts WHERE id = ? FOR UPDATE',
    {
      replacements: [target.layoutId],
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  if (row === undefined) throw new Error(`layout ${target.layoutId} is gone`);
  if (target.known?.sequence === row.sequence) return target.known;
  const layout = await Layout.findByPk(target.layoutId, { transaction, rejectOnEmpty: true });
  return { document: decodeDocument(layout.document), sequence: layout.sequence };
}

/** Where those operations stand that were committed before: null for one that belongs to another layout. */
async function findPlaces(
  layoutId: string,
  entries: readonly OperationEntry[],
  transaction: Transaction,
): Promise<Map<string, number | null>> {
  const rows = await OperationRow.findAll({
    attributes: ['id', 'layoutId', 'sequence'],
    where: { id: { [Op.in]: entries.map((entry) => entry.operation.id) } },
    transaction,
  });
  return new Map(rows.map((row) => [row.id, row.layoutId === layoutId ? row.sequence : null]));
}

function applyEntries(
  layoutId: string,
  before: LayoutState,
  entries: readonly OperationEntry[],
  places: Map<string, number | null>,
  now: Date,
): Applied {
  let { document, sequence } = before;
  const committed: CommittedOperation[] = [];
  const texts: string[] = [];
  const answers = entries.map(({ operation, changesText, memberId, memberName }): Result<number> => {
    const place = places.get(operation.id);
    if (place === null) {
      return refuse('conflict', `The operation's identifier was used in another layout than ${layoutId}.`);
    }
    if (place !== undefined) return accept(place);
    const applied = applyOperation(document, operation);
    if (!applied.ok) return applied;
    document = applied.value;
    sequence += 1;
    places.set(operation.id, sequence);
    texts.push(changesText);
    committed.push({ sequence, operation, memberId, memberName, committedAt: now.toISOString() });
    return accept(sequence);
  });
  return { state: { document, sequence }, answers, committed, texts };
}

async function write(target: CommitTarget, outcome: Applied, transaction: Transaction): Promise<void> {
  const { layoutId, touchedJobId } = target;
  await OperationRow.bulkCreate(
    outcome.committed.map(({ sequence, operation, memberId, memberName, committedAt }, index) => ({
      layoutId,
      sequence,
      id: operation.id,
      memberId,
      memberName,
      version: operation.version,
      changes: outcome.texts[index] ?? JSON.stringify(operation.changes),
      committedAt: new Date(committedAt),
    })),
    { transaction },
  );
  await Layout.update(
    { document: encodeDocument(outcome.state.document), sequence: outcome.state.sequence },
    { where: { id: layoutId }, transaction },
  );
  if (touchedJobId !== null) await touchJob(touchedJobId, transaction);
}
