import type { LayoutState } from '../commands/commit-operations';
import type { Layout as LayoutRow } from '../models/layout';
import { can, type Actor } from '../policies/policy';
import type { Layout } from '@/shared/api/layouts';
import type { LayoutEstimate } from '@/shared/api/live';
import { nextRevisionLetter } from '@/shared/layout/revision-letters';

/** What a layout is presented with besides its row. */
export interface LayoutContext {
  readonly state: LayoutState;
  readonly lastLetter: string | null;
  readonly estimate: LayoutEstimate | null;
}

/**
 * A layout, as a member sees it.
 * @throws Error when its platform and job were not loaded.
 */
export function presentLayout(
  actor: Actor,
  layout: LayoutRow,
  { state, lastLetter, estimate }: LayoutContext,
): Layout {
  const { platform } = layout;
  const job = platform?.job;
  if (!platform || !job) throw new Error('the layout came without its platform and job');
  return {
    id: layout.id,
    name: layout.name,
    job: { id: job.id, name: job.name },
    platform: { id: platform.id, name: platform.name },
    lastLetter,
    nextLetter: nextRevisionLetter(lastLetter),
    sequence: state.sequence,
    document: state.document,
    estimate: estimate && { sequence: estimate.sequence, result: estimate.result },
    abilities: presentLayoutAbilities(actor, layout),
  };
}

/** What a member may do to a layout. */
export function presentLayoutAbilities(
  actor: Actor,
  layout: { readonly teamId: string },
): Layout['abilities'] {
  return {
    edit: can(actor, 'edit-layouts', layout),
    comment: can(actor, 'comment-on-layout', layout),
    saveRevision: can(actor, 'save-revision', layout),
    submitRevision: can(actor, 'submit-revision', {
      teamId: layout.teamId,
      frozen: false,
      submittedById: null,
    }),
  };
}
