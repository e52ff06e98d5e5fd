import { notifyManager, QueryClientProvider } from '@tanstack/react-query';
import { act, render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { SessionProvider, useSessionState } from '@/components/api/session-provider';
import type { Session } from '@/shared/api/session';
import { ERROR_STATUS, type ErrorCode, type Problem } from '@/shared/errors';
import { createId } from '@/shared/ids';

// Without its timer, what a query has to tell arrives while React still listens.
notifyManager.setScheduler(queueMicrotask);

/** A session of an approver, as the server describes it. */
export const SESSION: Session = {
  person: { id: createId(), name: 'Ada Approver', email: 'ada@example.com' },
  member: { id: createId(), name: 'Ada Approver', initials: 'AA', roles: ['approver'] },
  team: { id: createId(), name: 'Workshop' },
  teams: [],
  demo: false,
  abilities: { seeJobs: true, createJob: false, editParts: false, administer: false, seeMails: false },
};

type Answer = { readonly status: number; readonly body: unknown };

/** What the server answers when it does what was asked. */
export function done(body: unknown, status = 200): Answer {
  return { status, body };
}

/** The server's refusal as a problem document. */
export function refused(code: ErrorCode, detail: string, problems: readonly Problem[] = []): Answer {
  const status = ERROR_STATUS[code];
  return { status, body: { type: 'about:blank', title: code, status, detail, code, problems } };
}

/** Stands in for the network: answers each request with the next answer that was prepared for it. */
export class StubApi {
  /** Every request that was sent: method, path, body. */
  readonly requests: { readonly route: string; readonly body: unknown }[] = [];
  private readonly answers = new Map<string, (Answer | 'unreachable')[]>();

  constructor() {
    this.prepare('GET /api/session', done(SESSION));
    globalThis.fetch = (input, init) => this.answer(`${init?.method ?? 'GET'} ${String(input)}`, init?.body);
  }

  /** Answers of a route in their order; the last one is given again. */
  prepare(route: string, ...answers: readonly (Answer | 'unreachable')[]): this {
    this.answers.set(route, [...answers]);
    return this;
  }

  /** What was sent to a route. */
  sentTo(route: string): unknown[] {
    return this.requests.filter((request) => request.route === route).map(({ body }) => body);
  }

  private async answer(route: string, body: BodyInit | null | undefined): Promise<Response> {
    this.requests.push({ route, body: typeof body === 'string' ? JSON.parse(body) : undefined });
    const prepared = this.answers.get(route);
    const next = prepared && prepared.length > 1 ? prepared.shift() : prepared?.[0];
    if (next === undefined) throw new Error(`no answer is prepared for ${route}`);
    if (next === 'unreachable') throw new TypeError('Failed to fetch');
    const text = JSON.stringify(next.body);
    return { ok: next.status < 400, status: next.status, text: async () => text } as Response;
  }
}

function WhenSignedIn({ children }: { readonly children: ReactNode }) {
  return useSessionState().state.status === 'signed-in' ? children : null;
}

/** Renders a part of the client for somebody signed in. */
export async function renderSignedIn(children: ReactNode): Promise<void> {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <SessionProvider>
        <WhenSignedIn>{children}</WhenSignedIn>
      </SessionProvider>
    </QueryClientProvider>,
  );
  await settle();
}

/** Lets everything happen that waits for nothing but its turn. */
export async function settle(): Promise<void> {
  for (let turn = 0; turn < 5; turn += 1) {
    await act(() => new Promise<void>((resolve) => setImmediate(resolve)));
  }
}
