import { useCallback, useSyncExternalStore } from 'react';

/** Whether a media query holds, for a component; false where there is no window. */
export function useMedia(query: string): boolean {
  const subscribe = useCallback(
    (listener: () => void) => {
      const list = globalThis.matchMedia?.(query);
      list?.addEventListener?.('change', listener);
      return () => list?.removeEventListener?.('change', listener);
    },
    [query],
  );
  const read = () => globalThis.matchMedia?.(query)?.matches ?? false;
  return useSyncExternalStore(subscribe, read, () => false);
}

/** Whether the system asks for reduced motion: then nothing moves that need not. */
export function useReducedMotion(): boolean {
  return useMedia('(prefers-reduced-motion: reduce)');
}
