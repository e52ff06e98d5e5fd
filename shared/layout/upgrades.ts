import { accept, refuse, type Result } from '../errors';
import { DOCUMENT_VERSION, type LayoutDocument } from './document';
import { referenceProblems, sizeProblems } from './integrity';
import { documentRule } from './rules/document-rules';
import { isPlainObject, problemsOf } from './rules/rule';

/** From one version to the next; pure. */
type Upgrade = (document: Record<string, unknown>) => Record<string, unknown>;

/** `UPGRADES.get(n)` makes version n + 1 of version n. Version 1 is the first: there is nothing before it. */
const UPGRADES: ReadonlyMap<number, Upgrade> = new Map();

/** A document of any known version as one of the current version, checked; refused with every problem's path. */
export function upgradeDocument(stored: unknown): Result<LayoutDocument> {
  if (!isPlainObject(stored)) return refuse('invalid', 'This is not a layout document.');
  let document = stored;
  let version = document['version'];
  while (typeof version === 'number' && version < DOCUMENT_VERSION) {
    const upgrade = UPGRADES.get(version);
    if (!upgrade) return refuse('invalid', `Nobody knows version ${version} of the layout document.`);
    document = upgrade(document);
    version = document['version'];
  }
  if (typeof version === 'number' && version > DOCUMENT_VERSION) {
    return refuse('outdated-client', 'This layout is of a newer version. Reload the window.');
  }
  const problems = problemsOf(documentRule, document);
  if (problems.length > 0) return refuse('invalid', 'This layout document does not hold.', problems);
  // The rule has just shown every field.
  const checked = document as unknown as LayoutDocument;
  const further = [...referenceProblems(checked), ...sizeProblems(checked)];
  return further.length > 0
    ? refuse('invalid', 'This layout document does not hold.', further)
    : accept(checked);
}
