import { randomInt, timingSafeEqual } from 'node:crypto';

const ALPHABET = '23456789abcdefghjkmnpqrstvwxyz';
const GROUPS = 3;
const GROUP_LENGTH = 5;

/** The one-time code that lets the first visitor of an empty database make a team. */
export class FirstVisit {
  readonly code: string = makeCode();
  private used = false;

  /** Takes the code if it is the right one and nobody took it before. */
  take(code: string): boolean {
    const given = Buffer.from(code.trim().toLowerCase());
    const wanted = Buffer.from(this.code);
    if (this.used || given.length !== wanted.length || !timingSafeEqual(given, wanted)) return false;
    this.used = true;
    return true;
  }

  /** Puts the code back after the team could not be made. */
  putBack(): void {
    this.used = false;
  }
}

function makeCode(): string {
  const group = () =>
    Array.from({ length: GROUP_LENGTH }, () => ALPHABET[randomInt(ALPHABET.length)]).join('');
  return Array.from({ length: GROUPS }, group).join('-');
}
