import { levelOfPower } from './levels';
import type { RadioFigures } from './radio-figures';

/**
 * Isolation, dB, between the two connectors that keeps From's carrier at the level which Into's receiver bears:
 * needed = P - P_overload. Holds at every carrier of From.
 * @source common practice of blocking budgets; levels as measured at the connectors
 */
export function overloadNeedDb(from: RadioFigures, into: RadioFigures): number {
  return levelOfPower(from.power) - into.overloadDbm;
}
