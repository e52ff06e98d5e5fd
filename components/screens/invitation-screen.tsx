import { useRouter } from 'expo-router';
import { describeError } from '@/components/api/api-problem';
import { useSessionState } from '@/components/api/session-provider';
import { useAcceptInvitation, useInvitationToken } from '@/components/api/use-account';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { acceptInvitationRequest, type invitationTokenSchema } from '@/shared/api/session';
import type { z } from 'zod';
import { DoorFrame } from './door-frame';
import { PASSWORD_HINT } from './password-words';
import { rolesText } from './role-words';
import { useScreenForm } from './screen-form';

/** Accepts an invitation by the link of a mail. */
export function InvitationScreen({ token }: { readonly token: string }) {
  const invitation = useInvitationToken(token);
  const { data } = invitation;
  return (
    <DoorFrame
      title={data ? `Join ${data.team}` : 'Invitation'}
      lead={data ? `${rolesText(data.roles)}, as ${data.email}` : undefined}
    >
      {invitation.isPending ? (
        <LoadingState label="Looking at the invitation" />
      ) : invitation.isError ? (
        <ErrorState title="This invitation does not hold" text={describeError(invitation.error)}>
          <Link alone href="/sign-in" label="Sign in" />
        </ErrorState>
      ) : (
        <AcceptForm token={token} invitation={invitation.data} />
      )}
    </DoorFrame>
  );
}

type AcceptFormProps = {
  readonly token: string;
  readonly invitation: z.infer<typeof invitationTokenSchema>;
};

function AcceptForm({ token, invitation: { email, hasAccount } }: AcceptFormProps) {
  const router = useRouter();
  const { state } = useSessionState();
  const form = useScreenForm({
    initial: { name: '', password: '' },
    schema: acceptInvitationRequest,
    bodyOf: ({ name, password }) => (hasAccount ? { token, password } : { token, name, password }),
    sender: useAcceptInvitation(),
    onDone: () => router.replace('/'),
    draft: { name: 'accept-invitation', fields: ['name'] },
  });
  return (
    <Form label="Accept the invitation" onSubmit={form.submit}>
      {state.status === 'signed-in' && state.session.person.email !== email ? (
        <Notice
          kind="info"
          text={`You are signed in as ${state.session.person.name}. Joining ends that session in this browser.`}
        />
      ) : null}
      {hasAccount ? null : (
        <Field
          label="Your name"
          value={form.values.name}
          onChange={(text) => form.set('name', text)}
          error={form.errorOf('name')}
          autoComplete="name"
          required
        />
      )}
      <Field
        label={hasAccount ? 'Your password' : 'Password'}
        hint={hasAccount ? 'You have an account already: its password.' : PASSWORD_HINT}
        value={form.values.password}
        onChange={(text) => form.set('password', text)}
        error={form.errorOf('password')}
        autoComplete={hasAccount ? 'current-password' : 'new-password'}
        secret
        required
      />
      {form.error ? <Notice kind="error" text={form.error} /> : null}
      <Button label="Join the team" variant="primary" onPress={form.submit} busy={form.busy} wide />
    </Form>
  );
}
