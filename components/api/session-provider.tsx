import { useQuery, useQueryClient } from '@tanstack/react-query';
import {
  createContext,
  useCallback,
  useContext,
  useEffect,
  useMemo,
  useRef,
  useState,
  type ReactNode,
} from 'react';
import { sessionSchema, type Session } from '@/shared/api/session';
import { ApiProblem } from './api-problem';
import { request } from './request';
import { setSessionRenewal } from './session-renewal';

export const SESSION_KEY = ['session'] as const;

type SessionState =
  | { readonly status: 'loading' }
  | { readonly status: 'unreachable'; readonly error: Error; readonly retry: () => void }
  | { readonly status: 'signed-out'; /** Somebody signed out in this page. */ readonly left: boolean }
  | { readonly status: 'signed-in'; readonly session: Session };

type SessionValue = {
  readonly state: SessionState;
  /** The session ran out while something was open: sign in again in place. */
  readonly expired: boolean;
  /** Takes over a session that the server just made. */
  readonly enter: (session: Session) => void;
  /** Forgets everything of this session. */
  readonly leave: () => void;
  /** Puts the question to sign in again aside; what waited for it is refused. */
  readonly dismissRenewal: () => void;
};

const SessionContext = createContext<SessionValue | null>(null);

/** Knows who is signed in, for everything below. */
export function SessionProvider({ children }: { readonly children: ReactNode }) {
  const client = useQueryClient();
  const query = useQuery({ queryKey: SESSION_KEY, queryFn: fetchSession, staleTime: Infinity });
  const [expired, setExpired] = useState(false);
  const [left, setLeft] = useState(false);
  const waiting = useRef<((renewed: boolean) => void)[]>([]);
  const session = query.data ?? null;
  const personId = session?.person.id ?? null;

  const settle = useCallback((renewed: boolean) => {
    const all = waiting.current;
    waiting.current = [];
    setExpired(false);
    for (const resolve of all) resolve(renewed);
  }, []);

  useEffect(() => {
    if (personId === null) return;
    setSessionRenewal(
      () =>
        new Promise((resolve) => {
          waiting.current.push(resolve);
          setExpired(true);
        }),
    );
    return () => setSessionRenewal(null);
  }, [personId]);

  const enter = useCallback(
    (next: Session) => {
      const same = personId === null || personId === next.person.id;
      if (!same || !expired)
        client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== SESSION_KEY[0] });
      client.setQueryData(SESSION_KEY, next);
      setLeft(false);
      settle(same);
    },
    [client, expired, personId, settle],
  );

  const leave = useCallback(() => {
    settle(false);
    client.clear();
    client.setQueryData(SESSION_KEY, null);
    setLeft(true);
  }, [client, settle]);

  const { isPending, error, refetch } = query;
  const value = useMemo<SessionValue>(
    () => ({
      state: session
        ? { status: 'signed-in', session }
        : isPending
          ? { status: 'loading' }
          : error
            ? { status: 'unreachable', error, retry: () => void refetch() }
            : { status: 'signed-out', left },
      expired,
      enter,
      leave,
      dismissRenewal: () => settle(false),
    }),
    [session, isPending, error, refetch, expired, left, enter, leave, settle],
  );
  return <SessionContext value={value}>{children}</SessionContext>;
}

/** The session's state and what can be done with it. */
export function useSessionState(): SessionValue {
  const value = useContext(SessionContext);
  if (!value) throw new Error('useSessionState outside of SessionProvider');
  return value;
}

/** The session of a screen that is only shown to somebody signed in. */
export function useSession(): Session {
  const { state } = useSessionState();
  if (state.status !== 'signed-in') throw new Error('useSession on a screen without a session');
  return state.session;
}

async function fetchSession({ signal }: { signal: AbortSignal }): Promise<Session | null> {
  try {
    return await request('GET', '/api/session', { schema: sessionSchema, signal, renew: false });
  } catch (error) {
    if (error instanceof ApiProblem && error.status === 401) return null;
    throw error;
  }
}
