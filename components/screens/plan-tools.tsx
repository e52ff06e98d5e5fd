import { View } from 'react-native';
import { useEditor } from '@/components/canvas/use-editor';
import { space } from '@/components/theme/tokens';
import { IconButton } from '@/components/ui/icon-button';
import type { Plan } from './plan-state';

type PlanToolsProps = { readonly plan: Plan; readonly column?: boolean };

/** What can be done with the view, and where a comment starts. */
export function PlanTools({ plan: { canvas, canComment }, column = false }: PlanToolsProps) {
  return (
    <View
      role="toolbar"
      aria-label="View of the plan"
      style={{ flexDirection: column ? 'column' : 'row', gap: space.s }}
    >
      {canComment ? (
        <IconButton
          framed
          icon="comment"
          label="Comment on a spot or an antenna"
          onPress={() => canvas.current?.startCommenting()}
        />
      ) : null}
      <IconButton framed icon="add" label="Nearer" onPress={() => canvas.current?.zoomBy(ZOOM)} />
      <IconButton framed icon="minus" label="Farther" onPress={() => canvas.current?.zoomBy(1 / ZOOM)} />
      <IconButton framed icon="refresh" label="Turn the plan" onPress={() => canvas.current?.turn()} />
      <IconButton framed icon="fit" label="Whole plan" onPress={() => canvas.current?.fit()} />
    </View>
  );
}

const ZOOM = 1.4;

/** Takes back my last change, or makes it again. */
export function UndoButtons({ plan: { editor } }: { readonly plan: Plan }) {
  const canUndo = useEditor(editor, (snapshot) => snapshot.canUndo);
  const canRedo = useEditor(editor, (snapshot) => snapshot.canRedo);
  const canEdit = useEditor(editor, (snapshot) => snapshot.canEdit);
  if (!canEdit) return null;
  return (
    <View style={{ flexDirection: 'row' }}>
      <IconButton icon="undo" label="Undo" disabled={!canUndo} onPress={() => editor.undo()} />
      <IconButton icon="redo" label="Redo" disabled={!canRedo} onPress={() => editor.redo()} />
    </View>
  );
}
