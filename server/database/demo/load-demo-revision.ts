import { writeRevision } from '../../commands/save-revision';
import { decodeDocument } from '../../models/document-codec';
import { RevisionEvent, type RevisionEventKind } from '../../models/revision-event';
import { createEstimator } from '@/shared/estimate/estimate';
import { DEMO_PEOPLE } from './demo-accounts';
import type { DemoContext } from './demo-context';
import { findDemoLayout } from './find-demo-layout';

const JOB = 'Harbour office';
const INTEGRATOR = 'integrator@example.com';
const APPROVER = 'approver@example.com';

/**
 * One frozen revision, so that an installer finds something to install. Computed on the spot (a quarter of a
 * second): nobody is served yet while the demo is loaded.
 */
export async function loadDemoRevision(context: DemoContext): Promise<void> {
  const { team, member, transaction } = context;
  const { job, platform, layout } = await findDemoLayout(context, JOB);
  const document = decodeDocument(layout.document);
  const saver = { teamId: team.id, memberId: member(INTEGRATOR).id, memberName: nameOf(INTEGRATOR) };
  const revision = await writeRevision(
    saver,
    layout.id,
    {
      state: { document, sequence: layout.sequence },
      results: createEstimator().estimate(document),
      note: 'Positions as surveyed on the roof.',
      names: { job: job.name, platform: platform.name, layout: layout.name },
    },
    transaction,
  );
  const happened = async (kind: RevisionEventKind, email: string, reason: string | null) =>
    RevisionEvent.create(
      {
        revisionId: revision.id,
        kind,
        memberId: member(email).id,
        memberName: nameOf(email),
        reason,
        at: new Date(),
      },
      { transaction },
    );
  await happened('submitted', INTEGRATOR, null);
  await happened('frozen', APPROVER, 'Agreed with the caretaker and the radio plan.');
}

function nameOf(email: string): string {
  const person = DEMO_PEOPLE.find((candidate) => candidate.email === email);
  if (person === undefined) throw new Error(`nobody in the demo has the address ${email}`);
  return person.name;
}
