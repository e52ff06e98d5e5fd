import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { measure, space } from '@/components/theme/tokens';
import { useSizeClass } from '@/components/theme/use-size-class';
import { Heading, Text } from '@/components/ui/text';
import { ConnectionStrip } from './connection-strip';
import { BottomBar, TopBar } from './navigation-bar';
import { usePageTitle } from './page-title';

type ScreenFrameProps = {
  /** Heading of the screen and name of the window. */
  readonly title: string;
  /** A line under the heading. */
  readonly lead?: string;
  /** What leads back up, above the heading. */
  readonly above?: ReactNode;
  /** What can be done here, beside the heading. */
  readonly actions?: ReactNode;
  readonly narrow?: boolean;
  readonly children: ReactNode;
};

/**
 * The frame of every screen but the plan: bar with the places, heading, content that scrolls. A route file holds
 * its parameters and one screen; the screen begins with this.
 */
export function ScreenFrame({ title, lead, above, actions, narrow = false, children }: ScreenFrameProps) {
  usePageTitle(title);
  const phone = useSizeClass() === 'phone';
  return (
    <View style={{ flex: 1 }}>
      <TopBar />
      <ConnectionStrip />
      <ScrollView role="main" contentContainerStyle={{ flexGrow: 1, padding: phone ? space.l : space.xl }}>
        <View
          style={{
            width: '100%',
            maxWidth: narrow ? measure.form : measure.page,
            alignSelf: 'center',
            gap: space.xl,
          }}
        >
          <View style={{ gap: space.xs }}>
            {above}
            <View
              style={{
                flexDirection: 'row',
                flexWrap: 'wrap',
                alignItems: 'center',
                justifyContent: 'space-between',
                gap: space.m,
              }}
            >
              <Heading level={1} style={{ flexShrink: 1 }}>
                {title}
              </Heading>
              {actions ? <View style={{ flexDirection: 'row', gap: space.s }}>{actions}</View> : null}
            </View>
            {lead ? <Text tone="soft">{lead}</Text> : null}
          </View>
          {children}
        </View>
      </ScrollView>
      {phone ? <BottomBar /> : null}
    </View>
  );
}
