import { del, get, set } from 'idb-keyval';
import { useCallback, useEffect, useRef, useState } from 'react';
import { useSessionState } from './session-provider';

const WRITE_AFTER_MS = 250;

export type Draft<T> = {
  /** False until it is known whether something was kept. */
  readonly ready: boolean;
  /** What was kept, null when nothing was. */
  readonly kept: T | null;
  /** Keeps a half-filled form; soon, not at every letter. */
  readonly keep: (value: T) => void;
  /** Forgets it: the form was sent, or thrown away. */
  readonly discard: () => void;
};

/**
 * Keeps a half-filled form in the browser so that it survives a reload; bound to the member, so that nobody else at
 * the same browser sees it (before anybody is signed in, to nobody). `read` makes sure that what was kept still
 * fits the form. Without a name nothing is kept.
 */
export function useDraft<T>(name: string | null, read: (kept: unknown) => T | null): Draft<T> {
  const { state: session } = useSessionState();
  const owner = session.status === 'signed-in' ? session.session.member.id : 'nobody';
  const key = name === null ? null : `draft:${owner}:${name}`;
  const [state, setState] = useState<{ key: string | null; kept: T | null } | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const waiting = useRef<{ key: string; value: T } | null>(null);
  const reader = useRef(read);

  useEffect(() => {
    let current = true;
    if (key === null) return;
    const settle = (kept: T | null) => {
      if (current) setState({ key, kept });
    };
    // A browser that forbids storage keeps no drafts; the form works all the same.
    get<unknown>(key).then(
      (kept) => settle(kept === undefined ? null : reader.current(kept)),
      () => settle(null),
    );
    return () => {
      current = false;
    };
  }, [key]);

  const flush = useCallback(() => {
    if (timer.current) clearTimeout(timer.current);
    timer.current = null;
    const next = waiting.current;
    waiting.current = null;
    if (next) set(next.key, next.value).catch(ignoreForbiddenStorage);
  }, []);

  useEffect(() => {
    globalThis.addEventListener?.('pagehide', flush);
    return () => {
      globalThis.removeEventListener?.('pagehide', flush);
      flush();
    };
  }, [flush]);

  const keep = useCallback(
    (value: T) => {
      if (key === null) return;
      waiting.current = { key, value };
      timer.current ??= setTimeout(flush, WRITE_AFTER_MS);
    },
    [key, flush],
  );

  const discard = useCallback(() => {
    waiting.current = null;
    if (key === null) return;
    del(key).catch(ignoreForbiddenStorage);
  }, [key]);

  const settled = key !== null && state?.key === key ? state : null;
  return { ready: key === null || settled !== null, kept: settled?.kept ?? null, keep, discard };
}

function ignoreForbiddenStorage(error: unknown): void {
  if (error instanceof DOMException) return;
  throw error;
}
