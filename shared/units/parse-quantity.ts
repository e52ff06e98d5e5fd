import { isReferred, named, plus, times, withUnit, type Measure, type Measured } from './quantity-arithmetic';
import { quoted, type QuantityToken } from './quantity-tokens';
import { fromUnit, kindOfUnit, type QuantityKind, type UnitSymbol } from './unit-table';

/** Brackets inside brackets; nobody measures deeper than that. */
const MOST_BRACKETS = 20;

/** Written in two units, the larger first; and where whole thousands are common enough to be grouped. */
const COMPOUND: QuantityKind = 'length';
const GROUPED: ReadonlySet<QuantityKind> = new Set(['length', 'power']);

/**
 * Recursive descent over the pieces of an entry:
 *
 *     sum      = product { ("+" | "-") product }
 *     product  = factor { ("*" | "/") factor }
 *     factor   = { "+" | "-" } ( number | "(" sum ")" ) [ unit { number unit } ]
 *     number   = digits [ whole "/" whole ]
 *
 * A unit belongs to the whole product before it while that has none: `1/4 in` is a quarter of an inch. Each method
 * answers with a measure or with the sentence that refuses the entry.
 */
export class QuantityParser {
  private at = 0;
  private depth = 0;

  constructor(
    private readonly tokens: readonly QuantityToken[],
    private readonly asked: QuantityKind,
  ) {}

  /** The whole entry. */
  parse(): Measured {
    const result = this.sum();
    const left = this.tokens[this.at];
    if (typeof result === 'string' || !left) return result;
    if (left.kind === 'unit') return 'That has two units.';
    return left.kind === 'sign' && left.sign === ')'
      ? 'A closing bracket has no opening one.'
      : `${quoted(left.text)} needs a sign before it.`;
  }

  private sum(): Measured {
    let result = this.product();
    while (typeof result !== 'string') {
      const sign = this.takeSign('+', '-');
      if (!sign) return result;
      const mark = this.workshopDash(sign);
      if (mark) return mark;
      const next = this.product();
      result = typeof next === 'string' ? next : plus(result, next, sign === '+' ? 1 : -1);
    }
    return result;
  }

  private product(): Measured {
    let result = this.factor(null, null);
    while (typeof result !== 'string') {
      const sign = this.takeSign('*', '/');
      if (!sign) return result;
      result = this.factor(result, sign);
    }
    return result;
  }

  /** The next factor, taken into the product before it. */
  private factor(before: Measure | null, operator: '*' | '/' | null): Measured {
    let negative = false;
    for (let sign = this.takeSign('+', '-'); sign; sign = this.takeSign('+', '-')) {
      if (sign === '-') negative = !negative;
    }
    const value = this.takeSign('(') ? this.bracket() : this.number();
    if (typeof value === 'string') return value;
    const factor: Measure = { kind: value.kind, number: negative ? -value.number : value.number };
    const joined = before && operator ? times(before, factor, operator) : factor;
    if (typeof joined === 'string') return joined;
    const unit = this.takeUnit();
    if (!unit) return joined;
    if (joined.kind !== null) {
      return factor.kind === null ? 'Only one part of a product can have a unit.' : 'That has two units.';
    }
    const kind = kindOfUnit(unit);
    if (before && isReferred(kind)) return `In a product ${named(kind)} means nothing.`;
    const measured = withUnit(joined, unit);
    return typeof measured === 'string' ? measured : this.compound(measured, unit, negative, before !== null);
  }

  /** What follows a length in a larger unit: `5 ft 3 1/2 in`. */
  private compound(first: Measure, unit: UnitSymbol, negative: boolean, inProduct: boolean): Measured {
    let result = first;
    let larger = unit;
    while (first.kind === COMPOUND && this.tokens[this.at]?.kind === 'number') {
      if (inProduct) return 'Put a length in two units into brackets, as in 2 × (5 ft 3 in).';
      const number = this.number();
      if (typeof number === 'string') return number;
      let share = number.number;
      if (this.takeSign('/')) {
        const divisor = this.number();
        if (typeof divisor === 'string') return divisor;
        if (divisor.number === 0) return 'That divides by zero.';
        share /= divisor.number;
      }
      const smaller = this.takeUnit();
      if (!smaller) return 'Write the unit of every part, as in 5 ft 3 in.';
      if (kindOfUnit(smaller) !== COMPOUND || fromUnit(1, smaller) >= fromUnit(1, larger)) {
        return 'Write the larger unit first, as in 5 ft 3 in.';
      }
      const part = withUnit({ kind: null, number: share }, smaller);
      const sum: Measured = typeof part === 'string' ? part : plus(result, part, negative ? -1 : 1);
      if (typeof sum === 'string') return sum;
      result = sum;
      larger = smaller;
    }
    return result;
  }

  private bracket(): Measured {
    this.depth += 1;
    if (this.depth > MOST_BRACKETS) return `At most ${MOST_BRACKETS} brackets can stand inside each other.`;
    const inside = this.sum();
    if (typeof inside === 'string') return inside;
    if (!this.takeSign(')')) {
      const next = this.tokens[this.at];
      return next ? `${quoted(next.text)} needs a sign before it.` : 'A bracket is not closed.';
    }
    this.depth -= 1;
    return inside;
  }

  /** A number, also with a fraction behind it: `5 1/2`. */
  private number(): Measured {
    const token = this.tokens[this.at];
    if (token?.kind !== 'number') return this.missing(token);
    if (token.twoReadings && GROUPED.has(this.asked)) {
      const [whole, decimals] = token.text.split(',');
      return `${quoted(token.text)} has two readings. Write ${whole}.${decimals} or ${whole}${decimals}.`;
    }
    this.at += 1;
    const [over, slash, under] = this.tokens.slice(this.at, this.at + 3);
    if (over?.kind !== 'number') return { kind: null, number: token.value };
    const fraction =
      token.whole && over.whole && isSign(slash, '/') && under?.kind === 'number' && under.whole
        ? under
        : null;
    if (!fraction)
      return `A sign or a unit is missing between ${quoted(token.text)} and ${quoted(over.text)}.`;
    if (fraction.value === 0) return 'That divides by zero.';
    this.at += 3;
    return { kind: null, number: token.value + over.value / fraction.value };
  }

  /**
   * A dash without blanks joins feet to inches and inches to their fraction on many drawings (5'-3", 5-1/2): read as
   * a minus it would be a wrong hole, so it is refused.
   */
  private workshopDash(sign: '+' | '-'): string | null {
    if (sign === '+' || this.asked !== 'length') return null;
    const [before, dash, number, slash, under] = this.tokens.slice(this.at - 2, this.at + 3);
    if (!dash?.tight || number?.kind !== 'number' || !number.tight) return null;
    if (before?.kind === 'unit' && before.unit === 'ft') {
      const next = this.tokens.slice(this.at).find((token) => token.kind !== 'number' && !isSign(token, '/'));
      const inches = next?.kind === 'unit' && next.unit === 'in';
      return inches ? 'Write 5 ft 3 in without a dash, or put blanks around a minus.' : null;
    }
    const fraction = before?.kind === 'number' && before.whole && number.whole && isSign(slash, '/');
    return fraction && under?.kind === 'number' && under.whole
      ? `Write ${before.text} ${number.text}/${under.text} without a dash, or put blanks around a minus.`
      : null;
  }

  private missing(token: QuantityToken | undefined): string {
    if (!token) return 'Something is missing at the end.';
    return `A number is missing before ${quoted(token.text)}.`;
  }

  private takeUnit(): UnitSymbol | null {
    const token = this.tokens[this.at];
    if (token?.kind !== 'unit') return null;
    this.at += 1;
    return token.unit;
  }

  private takeSign<Sign extends '+' | '-' | '*' | '/' | '(' | ')'>(...signs: readonly Sign[]): Sign | null {
    const token = this.tokens[this.at];
    if (token?.kind !== 'sign') return null;
    const found = signs.find((sign) => sign === token.sign);
    if (found) this.at += 1;
    return found ?? null;
  }
}

function isSign(token: QuantityToken | undefined, sign: string): boolean {
  return token?.kind === 'sign' && token.sign === sign;
}
