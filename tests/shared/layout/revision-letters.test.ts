import fc from 'fast-check';
import { nextRevisionLetter, revisionLetter, revisionNumber } from '@/shared/layout/revision-letters';

describe('letters of revisions', () => {
  test('begin with A and leave out I, O, Q, S, X and Z', () => {
    const letters = Array.from({ length: 20 }, (_, index) => revisionLetter(index + 1));
    expect(letters.join('')).toBe('ABCDEFGHJKLMNPRTUVWY');
  });

  test('go on with two letters after Y', () => {
    expect(nextRevisionLetter(null)).toBe('A');
    expect(nextRevisionLetter('H')).toBe('J');
    expect(nextRevisionLetter('Y')).toBe('AA');
    expect(nextRevisionLetter('AY')).toBe('BA');
    expect(nextRevisionLetter('YY')).toBe('AAA');
  });

  test('count there and back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1_000_000 }), (number) => {
        const letter = revisionLetter(number);
        return revisionNumber(letter) === number && nextRevisionLetter(letter) === revisionLetter(number + 1);
      }),
      { seed: 91, numRuns: 500 },
    );
  });

  test.each(['', 'I', 'O', 'Q', 'S', 'X', 'Z', 'AI', 'a', '1', 'A '])('%j is none', (letter) => {
    expect(() => nextRevisionLetter(letter)).toThrow();
  });

  test.each([0, -1, 1.5, Number.NaN])('there is no revision number %d', (number) => {
    expect(() => revisionLetter(number)).toThrow();
  });
});
