import { partContentSchema, type PartContent } from '@/shared/api/parts';

/**
 * The stored content of a part, checked.
 * @throws Error when what is stored is no part.
 */
export function decodePart(text: string): PartContent {
  return partContentSchema.parse(JSON.parse(text));
}

/** The text that a part's content is stored as. */
export function encodePart(content: PartContent): string {
  return JSON.stringify(content);
}

/** The name of a part, from its content. */
export function nameOfPart(content: PartContent): string {
  return content.kind === 'antenna' ? content.antenna.name : content.radio.name;
}
