import { View } from 'react-native';
import { useConnected } from '@/components/api/connection';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Icon } from '@/components/ui/icon';
import { Text } from '@/components/ui/text';

/** One line across the page while the server is out of reach. */
export function ConnectionStrip() {
  const { color } = useTheme();
  const connected = useConnected();
  return (
    <View role="status">
      {connected ? null : (
        <View
          style={{
            flexDirection: 'row',
            alignItems: 'center',
            gap: space.s,
            paddingHorizontal: space.l,
            paddingVertical: space.s,
            borderBottomWidth: line.hair,
            borderColor: color.tight,
            backgroundColor: color.sheet,
          }}
        >
          <Icon name="offline" tone="tight" />
          <Text variant="small" style={{ flexShrink: 1 }}>
            The server is out of reach. What you see may be old; what you type is kept.
          </Text>
        </View>
      )}
    </View>
  );
}
