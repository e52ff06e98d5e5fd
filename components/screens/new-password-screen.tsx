import { useState } from 'react';
import { describeError } from '@/components/api/api-problem';
import { useNewPassword, usePasswordToken } from '@/components/api/use-account';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Link, LinkButton } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { newPasswordRequest } from '@/shared/api/session';
import { DoorFrame } from './door-frame';
import { PASSWORD_HINT } from './password-words';
import { useScreenForm } from './screen-form';

/** Sets a new password by the link of a mail. */
export function NewPasswordScreen({ token }: { readonly token: string }) {
  const holder = usePasswordToken(token);
  const [done, setDone] = useState(false);
  return (
    <DoorFrame title="New password" lead={holder.data ? `For ${holder.data.email}` : undefined}>
      {done ? (
        <>
          <Notice
            kind="done"
            text="The new password holds from now on; all other sessions were signed out."
          />
          <LinkButton href="/sign-in" label="Sign in" primary />
        </>
      ) : holder.isPending ? (
        <LoadingState label="Looking at the link" />
      ) : holder.isError ? (
        <ErrorState title="This link does not hold" text={describeError(holder.error)}>
          <Link alone href="/forgotten" label="Ask for a new link" />
        </ErrorState>
      ) : (
        <NewPasswordForm token={token} onDone={() => setDone(true)} />
      )}
    </DoorFrame>
  );
}

function NewPasswordForm({ token, onDone }: { readonly token: string; readonly onDone: () => void }) {
  const form = useScreenForm({
    initial: { password: '' },
    schema: newPasswordRequest,
    bodyOf: ({ password }) => ({ token, password }),
    sender: useNewPassword(),
    onDone,
  });
  return (
    <Form label="Set a new password" onSubmit={form.submit}>
      <Field
        label="New password"
        hint={PASSWORD_HINT}
        value={form.values.password}
        onChange={(text) => form.set('password', text)}
        error={form.errorOf('password')}
        autoComplete="new-password"
        secret
        required
      />
      {form.error ? <Notice kind="error" text={form.error} /> : null}
      <Button label="Set the password" variant="primary" onPress={form.submit} busy={form.busy} wide />
    </Form>
  );
}
