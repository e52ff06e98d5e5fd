import { View } from 'react-native';
import { readLength } from '@/components/canvas/drawn-length';
import type { LengthUnit } from '@/components/canvas/round-length';
import { distancesFrom } from '@/components/editor/distances';
import type { Distance, EditorSnapshot } from '@/components/editor/editor-snapshot';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Text } from '@/components/ui/text';
import type { LabelOf } from './estimate-words';

type PlanReadoutProps = {
  readonly snapshot: EditorSnapshot;
  readonly unit: LengthUnit;
  readonly labelOf: LabelOf;
  /** How many neighbours there is room for. */
  readonly neighbours: number;
};

/** The chosen antenna in numbers: position, distances to neighbours and edges in length and wavelengths. */
export function PlanReadout({ snapshot, unit, labelOf, neighbours }: PlanReadoutProps) {
  const { color } = useTheme();
  const { painted, gesture, selection } = snapshot;
  const id = gesture?.id ?? selection[0];
  const antenna = id === undefined ? undefined : painted?.antennas[id];
  if (!painted || (!antenna && !gesture)) return null;
  const point = gesture?.point ?? antenna;
  if (!point) return null;
  const distances = gesture?.distances ?? (antenna ? distancesFrom(painted, antenna, antenna) : []);
  const edges = distances.filter(({ to }) => to.kind === 'edge');
  const others = distances.filter(({ to }) => to.kind === 'antenna').slice(0, neighbours);
  return (
    <View
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        columnGap: space.l,
        paddingHorizontal: space.m,
        paddingVertical: space.s,
        borderWidth: line.hair,
        borderColor: color.edge,
        backgroundColor: color.sheet,
        pointerEvents: 'none',
      }}
    >
      <Text variant="smallFiguresStrong">
        {antenna ? `${antenna.label} ${antenna.name}` : (gesture?.label ?? '')}
      </Text>
      <Text variant="smallFigures">{`x ${readLength(point.x, unit)}`}</Text>
      <Text variant="smallFigures">{`y ${readLength(point.y, unit)}`}</Text>
      {others.map((distance) => (
        <DistanceText
          key={distance.to.kind === 'antenna' ? distance.to.id : 'edge'}
          words={distance.to.kind === 'antenna' ? `to ${labelOf(distance.to.id)}` : 'edge'}
          distance={distance}
          unit={unit}
        />
      ))}
      {edges.slice(0, 2).map((distance, index) => (
        <DistanceText key={index} words="edge" distance={distance} unit={unit} />
      ))}
    </View>
  );
}

type DistanceTextProps = {
  readonly words: string;
  readonly distance: Distance;
  readonly unit: LengthUnit;
};

function DistanceText({ words, distance, unit }: DistanceTextProps) {
  const wavelengths = distance.wavelengths === null ? '' : `  ${distance.wavelengths.toFixed(2)} λ`;
  return (
    <View style={{ flexDirection: 'row', gap: space.xs }}>
      <Text variant="smallFigures" tone="soft">
        {words}
      </Text>
      <Text variant="smallFigures">{`${readLength(distance.length, unit)}${wavelengths}`}</Text>
    </View>
  );
}
