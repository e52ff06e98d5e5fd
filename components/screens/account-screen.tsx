import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useSession } from '@/components/api/session-provider';
import { useChangeAccount, useChangePassword, useSignOut, useSwitchTeam } from '@/components/api/use-account';
import { changePreferences, usePreferences } from '@/components/theme/preferences';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { SelectField } from '@/components/ui/select-field';
import { Heading, Text } from '@/components/ui/text';
import { accountRequest, changePasswordRequest } from '@/shared/api/session';
import { PASSWORD_HINT } from './password-words';
import { rolesText } from './role-words';
import { ScreenFrame } from './screen-frame';
import { useScreenForm } from './screen-form';

/** The member's own account: name, password, how things are shown here, signing out. */
export function AccountScreen() {
  const { person, member, team } = useSession();
  return (
    <ScreenFrame title="Account" lead={`${person.email}. ${rolesText(member.roles)} in ${team.name}.`} narrow>
      <Part title="On this device">
        <DeviceChoices />
      </Part>
      <TeamPart />
      <Part title="Name">
        <NameForm />
      </Part>
      <Part title="Password">
        <PasswordForm />
      </Part>
      <Part title="Sessions">
        <SignOutButtons />
      </Part>
    </ScreenFrame>
  );
}

function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  const { color } = useTheme();
  return (
    <View style={{ gap: space.l, borderTopWidth: line.hair, borderColor: color.rule, paddingTop: space.l }}>
      <Heading level={2}>{title}</Heading>
      {children}
    </View>
  );
}

function DeviceChoices() {
  const { appearance, lengthUnit } = usePreferences();
  return (
    <View style={{ gap: space.l }}>
      <Choice
        label="Appearance"
        value={appearance}
        options={[
          { value: 'system', label: 'As the system' },
          { value: 'light', label: 'Light' },
          { value: 'dark', label: 'Dark' },
        ]}
        onChange={(next) => changePreferences({ appearance: next })}
      />
      <Choice
        label="Lengths in"
        value={lengthUnit}
        options={[
          { value: 'mm', label: 'Millimetres' },
          { value: 'in', label: 'Inches' },
        ]}
        onChange={(next) => changePreferences({ lengthUnit: next })}
      />
    </View>
  );
}

function TeamPart() {
  const { team, teams } = useSession();
  const switchTeam = useSwitchTeam();
  if (teams.length < 2) return null;
  return (
    <Part title="Team">
      <SelectField
        label="You work in"
        value={team.id}
        options={teams.map(({ id, name }) => ({ value: id, label: name }))}
        onChange={(teamId) => switchTeam.mutate({ teamId })}
        error={switchTeam.isError ? describeError(switchTeam.error) : undefined}
      />
    </Part>
  );
}

function NameForm() {
  const { person } = useSession();
  const change = useChangeAccount();
  const form = useScreenForm({
    initial: { name: person.name },
    schema: accountRequest,
    bodyOf: (values) => values,
    sender: change,
    draft: { name: 'account-name', fields: ['name'] },
  });
  return (
    <Form label="Name" onSubmit={form.submit}>
      <Field
        label="Your name"
        value={form.values.name}
        onChange={(text) => form.set('name', text)}
        error={form.errorOf('name')}
        autoComplete="name"
        required
      />
      {form.error ? <Notice kind="error" text={form.error} /> : null}
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
        <Button label="Save the name" onPress={form.submit} busy={form.busy} />
        <Text variant="small" tone="soft" live="polite">
          {change.isSuccess && form.values.name === person.name ? 'Saved.' : ''}
        </Text>
      </View>
    </Form>
  );
}

function PasswordForm() {
  const [changed, setChanged] = useState(false);
  const form = useScreenForm({
    initial: { currentPassword: '', password: '' },
    schema: changePasswordRequest,
    bodyOf: (values) => values,
    sender: useChangePassword(),
    onDone: () => {
      setChanged(true);
      form.set('currentPassword', '');
      form.set('password', '');
    },
  });
  return (
    <Form label="Password" onSubmit={form.submit}>
      <Field
        label="Present password"
        value={form.values.currentPassword}
        onChange={(text) => form.set('currentPassword', text)}
        error={form.errorOf('currentPassword')}
        autoComplete="current-password"
        secret
        required
      />
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
      {changed ? <Notice kind="done" text="Changed. Your other sessions were signed out." /> : null}
      <View style={{ flexDirection: 'row' }}>
        <Button label="Change the password" onPress={form.submit} busy={form.busy} />
      </View>
    </Form>
  );
}

function SignOutButtons() {
  const signOut = useSignOut();
  return (
    <View style={{ gap: space.m }}>
      {signOut.isError ? <Notice kind="error" text={describeError(signOut.error)} /> : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}>
        <Button
          label="Sign out"
          icon="sign-out"
          onPress={() => signOut.mutate(false)}
          busy={signOut.isPending && !signOut.variables}
        />
        <Button
          label="Sign out everywhere"
          onPress={() => signOut.mutate(true)}
          busy={signOut.isPending && signOut.variables}
        />
      </View>
    </View>
  );
}
