import { useSyncExternalStore } from 'react';

/** What this browser's user chose; kept in the browser, not in the account. */
export type Preferences = {
  readonly appearance: 'system' | 'light' | 'dark';
  /** Unit that lengths are shown in. */
  readonly lengthUnit: 'mm' | 'in';
};

const STORAGE_KEY = 'elbowroom.preferences';
const DEFAULTS: Preferences = { appearance: 'system', lengthUnit: 'mm' };

const listeners = new Set<() => void>();
let current: Preferences | null = null;

/** What is chosen now. */
export function readPreferences(): Preferences {
  current ??= restore();
  return current;
}

/** Changes some of it, for every part of the page at once. */
export function changePreferences(change: Partial<Preferences>): void {
  current = { ...readPreferences(), ...change };
  storage()?.setItem(STORAGE_KEY, JSON.stringify(current));
  for (const listener of listeners) listener();
}

/** Calls `listener` after every change, also one made in another tab; answers with the way to stop it. */
export function subscribePreferences(listener: () => void): () => void {
  listeners.add(listener);
  const fromOtherTab = (event: StorageEvent) => {
    if (event.key !== STORAGE_KEY) return;
    current = null;
    listener();
  };
  globalThis.addEventListener?.('storage', fromOtherTab);
  return () => {
    listeners.delete(listener);
    globalThis.removeEventListener?.('storage', fromOtherTab);
  };
}

/** The preferences, for a component. */
export function usePreferences(): Preferences {
  return useSyncExternalStore(subscribePreferences, readPreferences, readPreferences);
}

function restore(): Preferences {
  const text = storage()?.getItem(STORAGE_KEY);
  if (!text) return DEFAULTS;
  const kept = parseObject(text);
  return {
    appearance: kept.appearance === 'light' || kept.appearance === 'dark' ? kept.appearance : 'system',
    lengthUnit: kept.lengthUnit === 'in' ? 'in' : 'mm',
  };
}

function parseObject(text: string): Record<string, unknown> {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null ? { ...value } : {};
  } catch (error) {
    // Somebody else wrote under our key: what is unreadable counts as never chosen.
    if (error instanceof SyntaxError) return {};
    throw error;
  }
}

/** A browser that keeps nothing (storage forbidden) throws on the mere look at it. */
function storage(): Storage | null {
  try {
    return globalThis.localStorage ?? null;
  } catch (error) {
    if (error instanceof DOMException) return null;
    throw error;
  }
}
