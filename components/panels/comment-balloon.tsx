import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { line, radius, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';

type CommentBalloonProps = {
  readonly number: number;
  readonly resolved: boolean;
  readonly chosen?: boolean;
};

/** The numbered circle that stands on the drawing and in the list; dashed once it is resolved. */
export function CommentBalloon({ number, resolved, chosen = false }: CommentBalloonProps) {
  const { color } = useTheme();
  return (
    <View
      aria-hidden
      style={{
        width: space.xxl,
        height: space.xxl,
        borderRadius: radius.pill,
        borderWidth: chosen ? line.bold : line.hair,
        borderStyle: resolved ? 'dashed' : 'solid',
        borderColor: color[chosen ? 'action' : resolved ? 'edge' : 'ink'],
        backgroundColor: color.sheet,
        alignItems: 'center',
        justifyContent: 'center',
      }}
    >
      <Text variant="smallFiguresStrong" tone={chosen ? 'action' : resolved ? 'soft' : 'ink'}>
        {String(number)}
      </Text>
    </View>
  );
}
