import { useCallback, useSyncExternalStore } from 'react';

/** One list for each query: every text asks for its theme in every render, and making a list is slow. */
const lists = new Map<string, MediaQueryList>();

function listOf(query: string): MediaQueryList | undefined {
  const kept = lists.get(query);
  if (kept) return kept;
  const made = globalThis.matchMedia?.(query);
  if (made) lists.set(query, made);
  return made;
}

/** Whether a media query holds, for a component; false where there is no window. */
export function useMedia(query: string): boolean {
  const subscribe = useCallback(
    (listener: () => void) => {
      const list = listOf(query);
      list?.addEventListener?.('change', listener);
      return () => list?.removeEventListener?.('change', listener);
    },
    [query],
  );
  const read = () => listOf(query)?.matches ?? false;
  return useSyncExternalStore(subscribe, read, () => false);
}

/** Whether the system asks for reduced motion: then nothing moves that need not. */
export function useReducedMotion(): boolean {
  return useMedia('(prefers-reduced-motion: reduce)');
}
