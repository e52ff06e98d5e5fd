import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import { Checkbox } from '@/components/ui/checkbox';
import { Icon } from '@/components/ui/icon';
import { Text } from '@/components/ui/text';
import { ROLES, type Role } from '@/shared/api/fields';
import { ROLE_WORDS } from './role-words';

type RolesChoiceProps = {
  readonly roles: readonly Role[];
  readonly onChange: (roles: readonly Role[]) => void;
  readonly error?: string;
};

/** A set of roles: one person can have several. */
export function RolesChoice({ roles, onChange, error }: RolesChoiceProps) {
  return (
    <View role="group" aria-label="Roles">
      <Text variant="smallStrong">Roles</Text>
      {ROLES.map((role) => (
        <Checkbox
          key={role}
          label={ROLE_WORDS[role].name}
          hint={ROLE_WORDS[role].does}
          checked={roles.includes(role)}
          onChange={(checked) =>
            onChange(ROLES.filter((one) => (one === role ? checked : roles.includes(one))))
          }
        />
      ))}
      <View
        aria-live="polite"
        style={{ display: error ? 'flex' : 'none', flexDirection: 'row', gap: space.xs }}
      >
        {error ? (
          <>
            <Icon name="error" size="s" tone="lacking" />
            <Text variant="small" tone="lacking">
              {error}
            </Text>
          </>
        ) : null}
      </View>
    </View>
  );
}
