import { useId, type ReactNode } from 'react';
import { Modal, Pressable, ScrollView, View } from 'react-native';
import { line, measure, radius, space } from '../theme/tokens';
import { useSizeClass } from '../theme/use-size-class';
import { useTheme } from '../theme/use-theme';
import { IconButton } from './icon-button';
import { Heading } from './text';
import { webAttributes } from './web-attributes';

type DialogProps = {
  readonly open: boolean;
  readonly title: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** Buttons at the foot; the one that matters last. */
  readonly actions?: ReactNode;
  /** For forms with tables: takes more of the window. */
  readonly large?: boolean;
  /** Cannot be put aside by a press beside it; what was typed stays. */
  readonly insistent?: boolean;
};

/** Something that must be answered first: in the middle of the window, from below on a phone. */
export function Dialog({
  open,
  title,
  onClose,
  children,
  actions,
  large = false,
  insistent = false,
}: DialogProps) {
  const { color } = useTheme();
  const phone = useSizeClass() === 'phone';
  const titleId = useId();
  if (!open) return null;
  return (
    <Modal
      visible
      transparent
      animationType="none"
      onRequestClose={onClose}
      {...webAttributes({ 'aria-labelledby': titleId })}
    >
      <View
        style={{
          flex: 1,
          justifyContent: phone ? 'flex-end' : 'center',
          alignItems: 'center',
          padding: phone ? space.none : space.xl,
        }}
      >
        <Pressable
          aria-hidden
          onPress={insistent ? undefined : onClose}
          {...webAttributes({ tabIndex: -1 })}
          style={{
            position: 'absolute',
            inset: space.none,
            backgroundColor: color.scrim,
            cursor: 'auto',
          }}
        />
        <View
          style={{
            width: '100%',
            maxWidth: phone ? undefined : large ? measure.text : measure.dialog,
            maxHeight: phone ? '92%' : '100%',
            backgroundColor: color.sheet,
            borderWidth: line.hair,
            borderColor: color.edge,
            borderRadius: phone ? radius.none : radius.m,
            borderTopLeftRadius: phone ? radius.l : radius.m,
            borderTopRightRadius: phone ? radius.l : radius.m,
          }}
        >
          <View
            style={{
              flexDirection: 'row',
              alignItems: 'center',
              gap: space.s,
              paddingLeft: space.l,
              paddingRight: space.s,
              paddingVertical: space.s,
              borderBottomWidth: line.hair,
              borderColor: color.rule,
            }}
          >
            <Heading level={2} id={titleId} style={{ flex: 1 }}>
              {title}
            </Heading>
            <IconButton label="Close" icon="close" onPress={onClose} />
          </View>
          <ScrollView contentContainerStyle={{ padding: space.l, gap: space.l }}>{children}</ScrollView>
          {actions ? (
            <View
              style={{
                flexDirection: 'row',
                flexWrap: 'wrap',
                justifyContent: 'flex-end',
                gap: space.s,
                padding: space.l,
                borderTopWidth: line.hair,
                borderColor: color.rule,
              }}
            >
              {actions}
            </View>
          ) : null}
        </View>
      </View>
    </Modal>
  );
}
