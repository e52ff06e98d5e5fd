import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { line, measure, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Mark } from '@/components/ui/mark';
import { Heading, Text } from '@/components/ui/text';
import { ConnectionStrip } from './connection-strip';
import { usePageTitle } from './page-title';

type DoorFrameProps = { readonly title: string; readonly lead?: string; readonly children: ReactNode };

/** The frame of the screens before the session: one sheet with the product's name. */
export function DoorFrame({ title, lead, children }: DoorFrameProps) {
  const { color } = useTheme();
  usePageTitle(title);
  return (
    <View style={{ flex: 1 }}>
      <ConnectionStrip />
      <ScrollView
        role="main"
        contentContainerStyle={{ flexGrow: 1, alignItems: 'center', padding: space.l, paddingTop: space.xxl }}
      >
        <View style={{ width: '100%', maxWidth: measure.dialog, gap: space.xl }}>
          <View
            style={{
              flexDirection: 'row',
              alignItems: 'center',
              gap: space.s,
              paddingBottom: space.m,
              borderBottomWidth: line.bold,
              borderColor: color.ink,
            }}
          >
            <Mark size="xl" />
            <View style={{ flexShrink: 1 }}>
              <Text variant="heading">Elbowroom</Text>
              <Text variant="small" tone="soft">
                Antennas on cramped platforms, placed together
              </Text>
            </View>
          </View>
          <View style={{ gap: space.xs }}>
            <Heading level={1} variant="title">
              {title}
            </Heading>
            {lead ? <Text tone="soft">{lead}</Text> : null}
          </View>
          {children}
        </View>
      </ScrollView>
    </View>
  );
}
