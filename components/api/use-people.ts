import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  invitationListSchema,
  mailListSchema,
  memberListSchema,
  type invitationRequest,
  type memberChangeRequest,
} from '@/shared/api/session';
import { request } from './request';

const MEMBERS = ['members'] as const;
const INVITATIONS = ['invitations'] as const;
const MAILS_EVERY_MS = 4000;

export function useMembers() {
  return useQuery({
    queryKey: MEMBERS,
    queryFn: ({ signal }) => request('GET', '/api/members', { schema: memberListSchema, signal }),
  });
}

export function useChangeMember() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, ...body }: { readonly id: string } & z.input<typeof memberChangeRequest>) =>
      request('PATCH', `/api/members/${encodeURIComponent(id)}`, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: MEMBERS }),
  });
}

export function useInvitations(enabled: boolean) {
  return useQuery({
    queryKey: INVITATIONS,
    enabled,
    queryFn: ({ signal }) => request('GET', '/api/invitations', { schema: invitationListSchema, signal }),
  });
}

export function useInvite() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof invitationRequest>) => request('POST', '/api/invitations', { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: INVITATIONS }),
  });
}

export function useWithdrawInvitation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => request('DELETE', `/api/invitations/${encodeURIComponent(id)}`),
    onSuccess: () => client.invalidateQueries({ queryKey: INVITATIONS }),
  });
}

export function useSendInvitationAgain() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => request('POST', `/api/invitations/${encodeURIComponent(id)}/send`),
    onSuccess: () => client.invalidateQueries({ queryKey: INVITATIONS }),
  });
}

/** The mails that the demo caught, newest first; looked for again while the screen is open. */
export function useMails() {
  return useQuery({
    queryKey: ['mails'],
    refetchInterval: MAILS_EVERY_MS,
    queryFn: ({ signal }) => request('GET', '/api/mails', { schema: mailListSchema, signal }),
  });
}
