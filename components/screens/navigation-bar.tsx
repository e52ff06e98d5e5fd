import { usePathname } from 'expo-router';
import { View } from 'react-native';
import { useSession } from '@/components/api/session-provider';
import { letter, line, measure, space } from '@/components/theme/tokens';
import { useSizeClass } from '@/components/theme/use-size-class';
import { useTheme } from '@/components/theme/use-theme';
import { Icon } from '@/components/ui/icon';
import { LinkArea } from '@/components/ui/link';
import { Mark } from '@/components/ui/mark';
import { Text } from '@/components/ui/text';
import { homeOf, placesFor } from './places';

/** The bar at the top: the product, the places, whose session it is. On a phone the places are at the foot. */
export function TopBar() {
  const { color } = useTheme();
  const session = useSession();
  const phone = useSizeClass() === 'phone';
  return (
    <View
      role="banner"
      {...{ dataSet: { noprint: '' } }}
      style={{
        minHeight: measure.header,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.l,
        paddingHorizontal: space.l,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
        backgroundColor: color.sheet,
      }}
    >
      <LinkArea href={homeOf(session)} label="Elbowroom, to the start">
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
          <Mark />
          <Text variant="title">Elbowroom</Text>
        </View>
      </LinkArea>
      {phone ? null : <Places />}
      <View style={{ flex: 1, alignItems: 'flex-end' }}>
        <Text variant="small" tone="soft" numberOfLines={1}>
          {phone ? session.person.name : `${session.person.name}, ${session.team.name}`}
        </Text>
      </View>
    </View>
  );
}

/** The places at the foot of a phone's screen. */
export function BottomBar() {
  const { color } = useTheme();
  return (
    <View
      {...{ dataSet: { noprint: '' } }}
      style={{ borderTopWidth: line.hair, borderColor: color.rule, backgroundColor: color.sheet }}
    >
      <Places bottom />
    </View>
  );
}

function Places({ bottom = false }: { readonly bottom?: boolean }) {
  const { color } = useTheme();
  const places = placesFor(useSession());
  const path = usePathname();
  return (
    <View role="navigation" aria-label="Places" style={{ flexDirection: 'row', alignSelf: 'stretch' }}>
      {places.map(({ href, label, icon }) => {
        const current = path === href || path.startsWith(`${href}/`);
        return (
          <LinkArea
            key={href}
            href={href}
            label={label}
            current={current}
            style={{
              flex: bottom ? 1 : undefined,
              minHeight: bottom ? measure.bottomBar : undefined,
              alignItems: 'center',
              paddingHorizontal: bottom ? space.xs : space.m,
              borderBottomWidth: bottom ? line.none : line.bold,
              borderTopWidth: bottom ? line.bold : line.none,
              borderColor: current ? color.action : 'transparent',
              gap: space.hair,
            }}
          >
            {bottom ? <Icon name={icon} tone={current ? 'action' : 'inkSoft'} /> : null}
            <Text
              variant={current ? 'smallStrong' : 'small'}
              tone={current ? 'action' : 'ink'}
              style={bottom ? letter.caption : undefined}
            >
              {label}
            </Text>
          </LinkArea>
        );
      })}
    </View>
  );
}
