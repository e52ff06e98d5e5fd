import type { LayoutDocument } from '@/shared/layout/document';
import { layoutDocumentCodec } from '@/shared/layout/schema';

/**
 * A stored document, checked and upgraded to the current version.
 * @throws Error when what is stored is no layout document.
 */
export function decodeDocument(text: string): LayoutDocument {
  return layoutDocumentCodec.parse(text);
}

/** The text that a document is stored as. */
export function encodeDocument(document: LayoutDocument): string {
  return JSON.stringify(document);
}
