import { View } from 'react-native';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Text } from '@/components/ui/text';
import type { PersonHere } from '@/shared/api/live';

type TitleBlockProps = {
  readonly title: string;
  /** "after B", "before the first revision". */
  readonly state: string;
  readonly people: readonly PersonHere[];
  readonly mySocketId: string | null;
  readonly onSize: (width: number, height: number) => void;
};

const WIDTH = 236;
const MOST_SHOWN = 5;

/** The drawing's title block: what it is, how old, and who looks at it at the moment. */
export function TitleBlock({ title, state, people, mySocketId, onSize }: TitleBlockProps) {
  const { color } = useTheme();
  const shown = people.slice(0, MOST_SHOWN);
  return (
    <View
      role="region"
      aria-label="Title block"
      onLayout={({ nativeEvent }) => onSize(nativeEvent.layout.width, nativeEvent.layout.height)}
      style={{
        width: WIDTH,
        borderWidth: line.hair,
        borderColor: color.ink,
        backgroundColor: color.sheet,
      }}
    >
      <View style={{ flexDirection: 'row', borderBottomWidth: line.hair, borderColor: color.ink }}>
        <View style={{ flex: 1, padding: space.s }}>
          <Text variant="smallFiguresStrong" numberOfLines={1}>
            {title}
          </Text>
        </View>
        <View style={{ padding: space.s, borderLeftWidth: line.hair, borderColor: color.ink }}>
          <Text variant="smallFigures">{state}</Text>
        </View>
      </View>
      <View style={{ padding: space.s }} aria-live="polite">
        <Text variant="smallFigures" tone="soft">
          Here now
        </Text>
        {shown.length === 0 ? <Text variant="smallFigures">nobody yet: no connection</Text> : null}
        {shown.map((person) => (
          <Text key={person.socketId} variant="smallFigures" numberOfLines={1}>
            {personLine(person, mySocketId)}
          </Text>
        ))}
        {people.length > MOST_SHOWN ? (
          <Text variant="smallFigures" tone="soft">{`and ${people.length - MOST_SHOWN} more`}</Text>
        ) : null}
      </View>
    </View>
  );
}

/** Somebody in a line: initials, name, what they are here as. */
export function personLine(person: PersonHere, mySocketId: string | null): string {
  const you = person.socketId === mySocketId ? ' (you)' : '';
  return `${person.initials} ${person.name}${you}, ${person.roles.join(', ')}`;
}
