import type { Problem } from '../errors';
import type { LayoutDocument } from './document';
import { LIMITS } from './limits';

/** References of a document that point nowhere: radios of antennas and of never-together rules. */
export function referenceProblems(document: LayoutDocument): Problem[] {
  const problems: Problem[] = [];
  for (const antenna of Object.values(document.antennas)) {
    if (antenna.radioId !== null && !Object.hasOwn(document.radios, antenna.radioId)) {
      problems.push({ path: `antennas.${antenna.id}.radioId`, message: 'names a radio that does not exist' });
    }
  }
  for (const rule of Object.values(document.neverTogether)) {
    const path = `neverTogether.${rule.id}.radioIds`;
    const [one, other] = rule.radioIds;
    if (one === other) problems.push({ path, message: 'names the same radio twice' });
    if (rule.radioIds.some((id) => !Object.hasOwn(document.radios, id))) {
      problems.push({ path, message: 'names a radio that does not exist' });
    }
  }
  return problems;
}

/** Points of all outlines of a document together. */
export function countOutlinePoints(document: LayoutDocument): number {
  const outlined = [
    ...Object.values(document.surfaces),
    ...Object.values(document.obstacles),
    ...Object.values(document.keepOuts),
  ];
  return outlined.reduce((sum, { outline }) => sum + outline.length, document.platform.outline.length);
}

/** Size of a document as it is stored, bytes of UTF-8. */
export function documentBytes(document: LayoutDocument): number {
  const text = JSON.stringify(document);
  let bytes = 0;
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    // Each half of a surrogate pair counts two: together the four bytes of UTF-8.
    bytes += code < 0x80 ? 1 : code < 0x800 || (code >= 0xd800 && code <= 0xdfff) ? 2 : 3;
  }
  return bytes;
}

/** What a whole document holds too much of: outline points, bytes. The collections have limits of their own. */
export function sizeProblems(document: LayoutDocument): Problem[] {
  const problems: Problem[] = [];
  if (countOutlinePoints(document) > LIMITS.outlinePoints) {
    problems.push({ path: '', message: `holds more than ${LIMITS.outlinePoints} outline points` });
  }
  if (documentBytes(document) > LIMITS.documentBytes) {
    problems.push({ path: '', message: `is larger than ${LIMITS.documentBytes / 1e6} MB` });
  }
  return problems;
}
