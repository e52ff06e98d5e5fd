import type { z } from 'zod';
import type { Layout } from '../models/layout';
import type { Platform } from '../models/platform';
import type { Revision } from '../models/revision';
import { eventsOf, stateOf } from '../models/revision-state';
import { can, type Actor } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import type { layoutBriefSchema, platformBriefSchema, revisionBriefSchema } from '@/shared/api/jobs';

/** A layout with its revisions in a few words. */
export type LayoutBrief = z.infer<typeof layoutBriefSchema>;

/** A platform with its layouts in a few words. */
export type PlatformBrief = z.infer<typeof platformBriefSchema>;

/** A platform with its layouts. Who only sees frozen revisions gets the layouts that have one. */
export function presentPlatform(
  actor: Actor,
  platform: Platform,
  layouts: readonly { readonly layout: Layout; readonly revisions: readonly Revision[] }[],
): PlatformBrief {
  const seesAll = can(actor, 'see-layouts', platform);
  return {
    id: platform.id,
    name: platform.name,
    kind: platform.kind,
    layouts: layouts
      .map(({ layout, revisions }) => presentLayoutBrief(actor, layout, revisions))
      .filter((layout) => seesAll || layout.revisions.length > 0),
  };
}

/** A layout with those of its revisions that the member may see, newest first. */
export function presentLayoutBrief(
  actor: Actor,
  layout: Layout,
  revisions: readonly Revision[],
): LayoutBrief {
  return {
    id: layout.id,
    name: layout.name,
    updatedAt: layout.updatedAt.toISOString(),
    revisions: revisions
      .filter((revision) => can(actor, 'see-revision', revisionRecord(revision)))
      .map(presentRevisionBrief),
  };
}

function presentRevisionBrief(revision: Revision): z.infer<typeof revisionBriefSchema> {
  const last = eventsOf(revision).at(-1);
  return {
    id: revision.id,
    letter: revision.letter,
    state: stateOf(revision),
    at: (last?.at ?? revision.savedAt).toISOString(),
  };
}
