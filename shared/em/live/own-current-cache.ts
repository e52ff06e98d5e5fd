import type { OwnCurrents } from './own-currents';

/** Own-current functions by kind of wire and frequency; a plain object that solvers may share. */
export type OwnCurrentCache = { readonly functions: Map<string, OwnCurrents>; readonly limit: number };

/** An empty cache that keeps at most `limit` kinds (one per wire kind and frequency). */
export function createOwnCurrentCache(limit = 20_000): OwnCurrentCache {
  return { functions: new Map(), limit };
}
