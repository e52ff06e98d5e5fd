import type { Part as PartRow } from '../models/part';
import { decodePart } from '../models/part-codec';
import { can, type Actor } from '../policies/policy';
import type { Part } from '@/shared/api/parts';

/** A part of the shelf, as a member sees it. */
export function presentPart(actor: Actor, part: PartRow): Part {
  return {
    id: part.id,
    name: part.name,
    content: decodePart(part.content),
    archived: part.archivedAt !== null,
    updatedAt: part.updatedAt.toISOString(),
    abilities: { edit: can(actor, 'edit-parts', part) },
  };
}
