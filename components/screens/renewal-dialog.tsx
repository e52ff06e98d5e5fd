import { useSessionState } from '@/components/api/session-provider';
import { useSignIn } from '@/components/api/use-account';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { signInRequest } from '@/shared/api/session';
import { useScreenForm } from './screen-form';

/** The session ran out while something was open: the password once more, in place; nothing typed is lost. */
export function RenewalDialog() {
  const { state, expired, dismissRenewal } = useSessionState();
  if (state.status !== 'signed-in' || !expired) return null;
  return <RenewalForm email={state.session.person.email} onClose={dismissRenewal} />;
}

function RenewalForm({ email, onClose }: { readonly email: string; readonly onClose: () => void }) {
  const form = useScreenForm({
    initial: { password: '' },
    schema: signInRequest,
    bodyOf: ({ password }) => ({ email, password }),
    sender: useSignIn(),
  });
  return (
    <Dialog
      open
      insistent
      title="Sign in again"
      onClose={onClose}
      actions={<Button label="Sign in" variant="primary" onPress={form.submit} busy={form.busy} />}
    >
      <Form label="Sign in again" onSubmit={form.submit}>
        <Text>{`Your session ended. What you typed is kept; sign in as ${email} to go on.`}</Text>
        <Field
          label="Password"
          value={form.values.password}
          onChange={(text) => form.set('password', text)}
          error={form.errorOf('password')}
          autoComplete="current-password"
          secret
          autoFocus
          required
        />
        {form.error ? <Notice kind="error" text={form.error} /> : null}
      </Form>
    </Dialog>
  );
}
