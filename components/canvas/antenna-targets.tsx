import { memo } from 'react';
import { View } from 'react-native';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import { target } from '@/components/theme/tokens';
import { webAttributes } from '@/components/ui/web-attributes';
import { compareLabels } from '@/shared/layout/labels';
import type { LengthUnit } from './round-length';
import { speakAntenna } from './spoken-antenna';
import { useEditor } from './use-editor';
import { toScreen, type Viewport } from './viewport';

type AntennaTargetsProps = {
  readonly editor: LayoutEditor;
  readonly view: Viewport;
  readonly unit: LengthUnit;
};

/** Element of an antenna's mark that can be focused. */
export function antennaTargetId(antennaId: string): string {
  return `plan-antenna-${antennaId}`;
}

/** What the Tab key and screen readers find on the plan: each antenna in the order of its mark. */
export function AntennaTargets({ editor, view, unit }: AntennaTargetsProps) {
  const painted = useEditor(editor, (snapshot) => snapshot.painted);
  const estimate = useEditor(editor, (snapshot) => snapshot.estimate);
  const selection = useEditor(editor, (snapshot) => snapshot.selection);
  const dragging = useEditor(editor, (snapshot) => snapshot.gesture !== null);
  if (!painted) return null;
  const labelOf = (id: string) => painted.antennas[id]?.label ?? 'an antenna that is gone';
  return Object.values(painted.antennas)
    .sort(compareLabels)
    .map((antenna) => {
      const at = toScreen(view, antenna);
      return (
        <AntennaTarget
          key={antenna.id}
          id={antenna.id}
          x={Math.round(at.x)}
          y={Math.round(at.y)}
          // not spoken anew in every frame of a drag: the live region tells where it came to rest
          label={dragging ? antenna.label : speakAntenna(antenna, estimate, unit, labelOf)}
          chosen={selection.includes(antenna.id)}
          editor={editor}
        />
      );
    });
}

type AntennaTargetProps = {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly label: string;
  readonly chosen: boolean;
  readonly editor: LayoutEditor;
};

const AntennaTarget = memo(function AntennaTarget({ id, x, y, label, chosen, editor }: AntennaTargetProps) {
  return (
    <View
      id={antennaTargetId(id)}
      role="button"
      aria-label={label}
      onFocus={() => {
        if (!editor.getSnapshot().selection.includes(id)) editor.select([id]);
      }}
      {...webAttributes({ tabIndex: 0, 'aria-pressed': chosen })}
      style={{
        position: 'absolute',
        left: x - target.min / 2,
        top: y - target.min / 2,
        width: target.min,
        height: target.min,
        pointerEvents: 'none',
      }}
    />
  );
});
