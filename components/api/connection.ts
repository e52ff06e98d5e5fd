import { useSyncExternalStore } from 'react';

const listeners = new Set<() => void>();
let lastRequestArrived = true;

/** Notes whether a request reached the server. */
export function noteArrival(arrived: boolean): void {
  if (arrived === lastRequestArrived) return;
  lastRequestArrived = arrived;
  for (const listener of listeners) listener();
}

/** Whether the server seems within reach: the browser is online and the last request arrived. */
export function useConnected(): boolean {
  return useSyncExternalStore(subscribe, isConnected, () => true);
}

function isConnected(): boolean {
  return lastRequestArrived && globalThis.navigator?.onLine !== false;
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  globalThis.addEventListener?.('online', listener);
  globalThis.addEventListener?.('offline', listener);
  return () => {
    listeners.delete(listener);
    globalThis.removeEventListener?.('online', listener);
    globalThis.removeEventListener?.('offline', listener);
  };
}
