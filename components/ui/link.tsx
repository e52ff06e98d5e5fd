import { Link as RouterLink, useRouter, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable, type GestureResponderEvent, type StyleProp, type ViewStyle } from 'react-native';
import { line, radius, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { Icon, type IconName } from './icon';
import { Text, textStyle } from './text';
import { webAttributes } from './web-attributes';

type LinkProps = {
  readonly href: Href;
  readonly label: string;
  readonly children?: ReactNode;
  readonly current?: boolean;
};

type TextLinkProps = LinkProps & {
  /** Stands alone in its line: as high as a button. */
  readonly alone?: boolean;
};

/** A link in a line of text. */
export function Link({ href, label, children, alone = false }: TextLinkProps) {
  const { color } = useTheme();
  return (
    <RouterLink
      href={href}
      aria-label={label}
      style={[
        textStyle('body'),
        { color: color.action, textDecorationLine: 'underline' },
        alone ? { lineHeight: target.min, alignSelf: 'flex-start', minWidth: target.min } : null,
      ]}
    >
      {children ?? label}
    </RouterLink>
  );
}

type LinkAreaProps = LinkProps & { readonly style?: StyleProp<ViewStyle> };

/** A whole area that leads somewhere: a line of a list, a place in the navigation. */
export function LinkArea({ href, label, children, current, style }: LinkAreaProps) {
  const { color } = useTheme();
  return (
    <Pressable
      aria-label={label}
      {...useLinkPress(href)}
      {...webAttributes({ href: String(href), 'aria-current': current ? 'page' : undefined })}
      style={({ pressed, hovered }: WebPressState) => [
        {
          minHeight: target.min,
          justifyContent: 'center',
          backgroundColor: pressed || hovered === true ? color.hover : 'transparent',
        },
        style,
      ]}
    >
      {children}
    </Pressable>
  );
}

type LinkButtonProps = LinkProps & { readonly icon?: IconName; readonly primary?: boolean };

/** A link that looks like a button. */
export function LinkButton({ href, label, icon, primary = false }: LinkButtonProps) {
  const { color } = useTheme();
  return (
    <Pressable
      aria-label={label}
      {...useLinkPress(href)}
      {...webAttributes({ href: String(href) })}
      style={({ pressed, hovered }: WebPressState) => ({
        minHeight: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: 'center',
        alignSelf: 'flex-start',
        gap: space.s,
        paddingHorizontal: space.l,
        borderRadius: radius.m,
        borderWidth: line.hair,
        borderColor: primary ? 'transparent' : color.edge,
        backgroundColor:
          pressed || hovered === true
            ? color[primary ? 'actionHover' : 'hover']
            : color[primary ? 'action' : 'sheet'],
      })}
    >
      {icon ? <Icon name={icon} tone={primary ? 'onAction' : 'ink'} /> : null}
      <Text variant="strong" tone={primary ? 'onAction' : 'ink'}>
        {label}
      </Text>
    </Pressable>
  );
}

/** Goes there inside the page; a press with a modifier key is left to the browser (new tab, new window). */
function useLinkPress(href: Href): { readonly onPress: (event: GestureResponderEvent) => void } {
  const router = useRouter();
  return {
    onPress: (event) => {
      const { ctrlKey, metaKey, shiftKey, altKey } = event.nativeEvent as unknown as MouseEvent;
      if (ctrlKey || metaKey || shiftKey || altKey) return;
      event.preventDefault();
      router.push(href);
    },
  };
}
