import { View } from 'react-native';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import { line, measure, radius, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Text } from '@/components/ui/text';
import { useEditor } from './use-editor';
import { toScreen, type Size, type Viewport } from './viewport';

type RefusalNoteProps = { readonly editor: LayoutEditor; readonly view: Viewport; readonly size: Size };

/** Above the finger, so that the finger does not hide it. */
const ABOVE = 46;

/** Why what is carried may not stand here, said at the finger. */
export function RefusalNote({ editor, view, size }: RefusalNoteProps) {
  const { color } = useTheme();
  const gesture = useEditor(editor, (snapshot) => snapshot.gesture);
  if (!gesture?.problem) return null;
  const at = toScreen(view, gesture.point);
  const left = Math.min(Math.max(space.s, at.x - measure.menu / 2), size.width - measure.menu - space.s);
  const low = at.y < size.height / 3;
  return (
    <View
      aria-live="assertive"
      style={{
        position: 'absolute',
        left,
        width: measure.menu,
        ...(low ? { top: at.y + ABOVE } : { bottom: size.height - at.y + ABOVE }),
        padding: space.s,
        borderWidth: line.bold,
        borderColor: color.lacking,
        borderRadius: radius.m,
        backgroundColor: color.sheet,
        pointerEvents: 'none',
      }}
    >
      <Text variant="smallStrong" tone="lacking">
        {gesture.problem.message}
      </Text>
      <Text variant="small" tone="soft">
        {gesture.kind === 'place' ? 'Let go: it returns to the shelf.' : 'Let go: it returns.'}
      </Text>
    </View>
  );
}
