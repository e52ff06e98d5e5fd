/** Letters of revisions in drawing practice: I, O, Q, S, X and Z are left out, they read like figures. */
const LETTERS = 'ABCDEFGHJKLMNPRTUVWY';

/** The letter after `last`, A after none, AA after Y, BA after AY. @throws Error for anything that is no revision letter. */
export function nextRevisionLetter(last: string | null): string {
  return last === null ? revisionLetter(1) : revisionLetter(revisionNumber(last) + 1);
}

/** The letter of the n-th revision, counted from 1: digits 1 ... 20 in base 20 without a zero. */
export function revisionLetter(number: number): string {
  if (!Number.isInteger(number) || number < 1) throw new Error(`there is no revision number ${number}`);
  const digit = (number - 1) % LETTERS.length;
  const rest = (number - 1 - digit) / LETTERS.length;
  return (rest === 0 ? '' : revisionLetter(rest)) + LETTERS.charAt(digit);
}

/** Which revision a letter is, counted from 1. @throws Error for anything that is no revision letter. */
export function revisionNumber(letter: string): number {
  if (letter === '') throw new Error('an empty revision letter');
  return [...letter].reduce((number, character) => {
    const digit = LETTERS.indexOf(character);
    if (digit < 0) throw new Error(`${letter} is not a revision letter`);
    return number * LETTERS.length + digit + 1;
  }, 0);
}
