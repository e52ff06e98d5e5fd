const ALPHABET = '0123456789abcdefghjkmnpqrstvwxyz';
const ID_LENGTH = 26;

/** Every identifier: 26 lower-case letters and digits (Crockford's base 32, 130 random bits). */
export const ID_PATTERN = /^[0-9a-hjkmnp-tv-z]{26}$/;

/** Makes a new identifier; works outside secure contexts too, where a browser has no `randomUUID`. */
export function createId(): string {
  const bytes = globalThis.crypto.getRandomValues(new Uint8Array(ID_LENGTH));
  return Array.from(bytes, (byte) => ALPHABET[byte & 31]).join('');
}
