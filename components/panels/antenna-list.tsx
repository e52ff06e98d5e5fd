import { memo } from 'react';
import { Pressable, View } from 'react-native';
import { drawnLength } from '@/components/canvas/drawn-length';
import type { LengthUnit } from '@/components/canvas/round-length';
import { line, space, target } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import type { WebPressState } from '@/components/ui/button';
import { Button } from '@/components/ui/button';
import { Heading, Text } from '@/components/ui/text';
import type { LayoutDocument } from '@/shared/layout/document';
import { compareLabels } from '@/shared/layout/labels';

type AntennaListProps = {
  readonly document: LayoutDocument;
  readonly selection: readonly string[];
  readonly unit: LengthUnit;
  readonly onSelect: (antennaId: string) => void;
  readonly onTable: () => void;
};

const PLACE = { vehicle: 'On this roof', rooftop: 'On this roof', handset: 'On this board' } as const;

/** The antennas of the plan with their positions; one tap chooses, the table edits all. */
export function AntennaList({ document, selection, unit, onSelect, onTable }: AntennaListProps) {
  const { color } = useTheme();
  const antennas = Object.values(document.antennas).sort(compareLabels);
  return (
    <View>
      <View
        style={{
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: 'space-between',
          borderBottomWidth: line.hair,
          borderColor: color.rule,
        }}
      >
        <Heading level={3} tone="soft">
          {PLACE[document.platform.kind]}
        </Heading>
        <Button label="Edit as a table" variant="quiet" onPress={onTable}>
          {`x, y in ${unit}`}
        </Button>
      </View>
      {antennas.length === 0 ? (
        <Text variant="small" tone="soft" style={{ paddingVertical: space.m }}>
          Nothing stands here yet. Drag a part from the shelf onto the plan, or press Enter on it.
        </Text>
      ) : null}
      {antennas.map((antenna) => (
        <AntennaRow
          key={antenna.id}
          id={antenna.id}
          label={antenna.label}
          name={antenna.name}
          x={drawnLength(antenna.x, unit)}
          y={drawnLength(antenna.y, unit)}
          chosen={selection.includes(antenna.id)}
          onSelect={onSelect}
        />
      ))}
    </View>
  );
}

type AntennaRowProps = {
  readonly id: string;
  readonly label: string;
  readonly name: string;
  readonly x: string;
  readonly y: string;
  readonly chosen: boolean;
  readonly onSelect: (antennaId: string) => void;
};

const AntennaRow = memo(function AntennaRow({ id, label, name, x, y, chosen, onSelect }: AntennaRowProps) {
  const { color } = useTheme();
  const tone = chosen ? 'action' : 'ink';
  return (
    <Pressable
      role="button"
      aria-label={`${label} ${name}, x ${x}, y ${y}`}
      aria-pressed={chosen}
      onPress={() => onSelect(id)}
      style={({ pressed, hovered }: WebPressState) => ({
        minHeight: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.s,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
        backgroundColor: pressed || hovered === true ? color.hover : chosen ? color.chosen : 'transparent',
      })}
    >
      <Text variant="smallFiguresStrong" tone={tone} style={{ width: 32 }}>
        {label}
      </Text>
      <Text variant="smallFigures" tone={tone} numberOfLines={1} style={{ flex: 1 }}>
        {name}
      </Text>
      <Text variant="smallFigures" tone={tone} align="right" style={{ width: 52 }}>
        {x}
      </Text>
      <Text variant="smallFigures" tone={tone} align="right" style={{ width: 52 }}>
        {y}
      </Text>
    </Pressable>
  );
});
