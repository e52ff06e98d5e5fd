import { Redirect } from 'expo-router';
import { Pressable, View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useSetup, useSignIn } from '@/components/api/use-account';
import { line, space, target } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button, type WebPressState } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Icon } from '@/components/ui/icon';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Text } from '@/components/ui/text';
import { signInRequest, type Setup } from '@/shared/api/session';
import { DoorFrame } from './door-frame';
import { rolesText } from './role-words';
import { useScreenForm } from './screen-form';

/** Sign in; in the demo with one press as any of its people. */
export function SignInScreen() {
  const setup = useSetup();
  if (setup.data?.state === 'first-visit') return <Redirect href="/setup" />;
  return (
    <DoorFrame title="Sign in">
      <SignInForm />
      {setup.isPending ? <LoadingState label="Asking the server" /> : null}
      {setup.isError ? (
        <ErrorState
          title="The server did not answer"
          text={describeError(setup.error)}
          onRetry={() => void setup.refetch()}
        />
      ) : null}
      {setup.data && setup.data.demoAccounts.length > 0 ? (
        <DemoAccounts accounts={setup.data.demoAccounts} />
      ) : null}
    </DoorFrame>
  );
}

function SignInForm() {
  const form = useScreenForm({
    initial: { email: '', password: '' },
    schema: signInRequest,
    bodyOf: (values) => values,
    sender: useSignIn(),
  });
  return (
    <Form label="Sign in" onSubmit={form.submit}>
      <Field
        label="E-mail"
        value={form.values.email}
        onChange={(text) => form.set('email', text)}
        error={form.errorOf('email')}
        autoComplete="username"
        inputMode="email"
        required
      />
      <Field
        label="Password"
        value={form.values.password}
        onChange={(text) => form.set('password', text)}
        error={form.errorOf('password')}
        autoComplete="current-password"
        secret
        required
      />
      {form.error ? <Notice kind="error" text={form.error} /> : null}
      <Button label="Sign in" variant="primary" onPress={form.submit} busy={form.busy} wide />
      <Link alone href="/forgotten" label="Forgotten the password?" />
    </Form>
  );
}

function DemoAccounts({ accounts }: { readonly accounts: Setup['demoAccounts'] }) {
  const { color } = useTheme();
  const signIn = useSignIn();
  return (
    <View style={{ gap: space.m, borderTopWidth: line.hair, borderColor: color.rule, paddingTop: space.l }}>
      <Heading level={2} variant="title">
        Or look around as
      </Heading>
      <Text variant="small" tone="soft">
        The demo is on: everything in it is invented, and its people sign in with one press.
      </Text>
      {signIn.isError ? <Notice kind="error" text={describeError(signIn.error)} /> : null}
      <View role="list" style={{ borderTopWidth: line.hair, borderColor: color.rule }}>
        {accounts.map(({ name, email, password, roles }) => (
          <View key={email} role="listitem">
            <AccountLine
              name={name}
              roles={rolesText(roles)}
              busy={signIn.isPending && signIn.variables.email === email}
              onPress={() => signIn.mutate({ email, password })}
            />
          </View>
        ))}
      </View>
    </View>
  );
}

type AccountLineProps = {
  readonly name: string;
  readonly roles: string;
  readonly busy: boolean;
  readonly onPress: () => void;
};

/** Its name is what stands in it: the roles, then the person. */
function AccountLine({ name, roles, busy, onPress }: AccountLineProps) {
  const { color } = useTheme();
  return (
    <Pressable
      role="button"
      aria-busy={busy || undefined}
      disabled={busy}
      onPress={onPress}
      style={({ pressed, hovered }: WebPressState) => ({
        minHeight: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingHorizontal: space.s,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
        backgroundColor: pressed || hovered === true ? color.hover : 'transparent',
      })}
    >
      <Text variant="strong" style={{ flex: 1 }}>
        {roles}
      </Text>
      <Text tone="soft" align="right">
        {busy ? 'Signing in' : name}
      </Text>
      <Icon name="chevron-right" tone="inkSoft" />
    </Pressable>
  );
}
