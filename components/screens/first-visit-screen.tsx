import { Redirect } from 'expo-router';
import { useFirstVisit, useSetup } from '@/components/api/use-account';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { firstVisitRequest } from '@/shared/api/session';
import { DoorFrame } from './door-frame';
import { PASSWORD_HINT } from './password-words';
import { useScreenForm } from './screen-form';

/** The first visitor of an empty server makes a team and its administrator. */
export function FirstVisitScreen() {
  const setup = useSetup();
  const form = useScreenForm({
    initial: { code: '', team: '', name: '', email: '', password: '' },
    schema: firstVisitRequest,
    bodyOf: (values) => values,
    sender: useFirstVisit(),
    draft: { name: 'first-visit', fields: ['team', 'name', 'email'] },
  });
  if (setup.data?.state === 'ready') return <Redirect href="/sign-in" />;
  return (
    <DoorFrame
      title="Make the first team"
      lead="Nobody has an account here yet. You become the administrator and can invite the others."
    >
      <Form label="Make the first team" onSubmit={form.submit}>
        <Field
          label="One-time code"
          hint="The server printed it where it was started."
          value={form.values.code}
          onChange={(text) => form.set('code', text)}
          error={form.errorOf('code')}
          autoComplete="one-time-code"
          figures
          required
        />
        <Field
          label="Name of the team"
          value={form.values.team}
          onChange={(text) => form.set('team', text)}
          error={form.errorOf('team')}
          autoComplete="organization"
          required
        />
        <Field
          label="Your name"
          value={form.values.name}
          onChange={(text) => form.set('name', text)}
          error={form.errorOf('name')}
          autoComplete="name"
          required
        />
        <Field
          label="Your e-mail"
          value={form.values.email}
          onChange={(text) => form.set('email', text)}
          error={form.errorOf('email')}
          autoComplete="username"
          inputMode="email"
          required
        />
        <Field
          label="Password"
          hint={PASSWORD_HINT}
          value={form.values.password}
          onChange={(text) => form.set('password', text)}
          error={form.errorOf('password')}
          autoComplete="new-password"
          secret
          required
        />
        {form.error ? <Notice kind="error" text={form.error} /> : null}
        <Button label="Make the team" variant="primary" onPress={form.submit} busy={form.busy} wide />
      </Form>
    </DoorFrame>
  );
}
