import { useMutation, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  invitationTokenSchema,
  passwordTokenSchema,
  sessionSchema,
  setupSchema,
  type acceptInvitationRequest,
  type accountRequest,
  type changePasswordRequest,
  type firstVisitRequest,
  type forgottenPasswordRequest,
  type newPasswordRequest,
  type signInRequest,
  type switchTeamRequest,
} from '@/shared/api/session';
import { request } from './request';
import { useSessionState } from './session-provider';

/** What the sign-in screen offers: first visit or not, demo accounts. */
export function useSetup() {
  return useQuery({
    queryKey: ['setup'],
    queryFn: ({ signal }) => request('GET', '/api/setup', { schema: setupSchema, signal, renew: false }),
  });
}

export function useSignIn() {
  const { enter } = useSessionState();
  return useMutation({
    mutationFn: (body: z.input<typeof signInRequest>) =>
      request('POST', '/api/session', { body, schema: sessionSchema, renew: false }),
    onSuccess: enter,
  });
}

export function useFirstVisit() {
  const { enter } = useSessionState();
  return useMutation({
    mutationFn: (body: z.input<typeof firstVisitRequest>) =>
      request('POST', '/api/setup', { body, schema: sessionSchema, renew: false }),
    onSuccess: enter,
  });
}

/** Signs out here, or everywhere. */
export function useSignOut() {
  const { leave } = useSessionState();
  return useMutation({
    mutationFn: (everywhere: boolean) =>
      request('DELETE', everywhere ? '/api/sessions' : '/api/session', { renew: false }),
    onSuccess: leave,
  });
}

export function useSwitchTeam() {
  const { enter } = useSessionState();
  return useMutation({
    mutationFn: (body: z.input<typeof switchTeamRequest>) =>
      request('PATCH', '/api/session', { body, schema: sessionSchema }),
    onSuccess: enter,
  });
}

export function useChangeAccount() {
  const { enter } = useSessionState();
  return useMutation({
    mutationFn: async (body: z.input<typeof accountRequest>) => {
      await request('PATCH', '/api/account', { body });
      return request('GET', '/api/session', { schema: sessionSchema });
    },
    onSuccess: enter,
  });
}

export function useChangePassword() {
  return useMutation({
    mutationFn: (body: z.input<typeof changePasswordRequest>) =>
      request('PUT', '/api/account/password', { body }),
  });
}

export function useForgottenPassword() {
  return useMutation({
    mutationFn: (body: z.input<typeof forgottenPasswordRequest>) =>
      request('POST', '/api/passwords/forgotten', { body, renew: false }),
  });
}

/** Whose password a link sets, while it holds. */
export function usePasswordToken(token: string) {
  return useQuery({
    queryKey: ['password-token', token],
    queryFn: ({ signal }) =>
      request('GET', `/api/passwords/${encodeURIComponent(token)}`, {
        schema: passwordTokenSchema,
        signal,
        renew: false,
      }),
  });
}

export function useNewPassword() {
  return useMutation({
    mutationFn: (body: z.input<typeof newPasswordRequest>) =>
      request('POST', '/api/passwords', { body, renew: false }),
  });
}

/** What an invitation offers, while it holds. */
export function useInvitationToken(token: string) {
  return useQuery({
    queryKey: ['invitation-token', token],
    queryFn: ({ signal }) =>
      request('GET', `/api/invitations/by-token/${encodeURIComponent(token)}`, {
        schema: invitationTokenSchema,
        signal,
        renew: false,
      }),
  });
}

export function useAcceptInvitation() {
  const { enter } = useSessionState();
  return useMutation({
    mutationFn: (body: z.input<typeof acceptInvitationRequest>) =>
      request('POST', '/api/invitations/accept', { body, schema: sessionSchema, renew: false }),
    onSuccess: enter,
  });
}
