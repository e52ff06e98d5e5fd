import type { Ground, Wire } from '../scene';
import { findOwnCurrents, type OwnCurrents } from './own-currents';
import { kindKey } from './placed-wire';

/** Own-current functions by kind of wire and frequency; a plain object that solvers may share. */
export type OwnCurrentCache = { readonly functions: Map<string, OwnCurrents>; readonly limit: number };

/** An empty cache that keeps at most `limit` kinds (one per wire kind and frequency). */
export function createOwnCurrentCache(limit = 20_000): OwnCurrentCache {
  return { functions: new Map(), limit };
}

/** The functions of a wire's kind at a frequency in hertz, found now unless the cache holds them. */
export function ownCurrentsOf(
  cache: OwnCurrentCache,
  ground: Ground,
  frequency: number,
  wire: Wire,
): OwnCurrents {
  const key = kindKey(wire, ground, frequency);
  const kept = cache.functions.get(key);
  if (kept !== undefined) return kept;
  const found = findOwnCurrents(ground, frequency, wire);
  // The oldest goes first: a layout in work asks again for its own at once.
  const oldest = cache.functions.keys().next();
  if (cache.functions.size >= cache.limit && !oldest.done) cache.functions.delete(oldest.value);
  cache.functions.set(key, found);
  return found;
}
