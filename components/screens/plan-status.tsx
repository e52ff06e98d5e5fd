import { View } from 'react-native';
import { useEditor } from '@/components/canvas/use-editor';
import type { Connection } from '@/components/editor/editor-snapshot';
import { space } from '@/components/theme/tokens';
import { Icon } from '@/components/ui/icon';
import { Text } from '@/components/ui/text';
import { assertNever } from '@/shared/errors';
import type { Plan } from './plan-state';

/** Whether what I do has arrived: saved, waiting, offline. */
export function PlanStatus({ plan: { editor } }: { readonly plan: Plan }) {
  const connection = useEditor(editor, (snapshot) => snapshot.connection);
  const waiting = useEditor(editor, (snapshot) => snapshot.pendingCount);
  const words = statusWords(connection, waiting);
  return (
    <View role="status" style={{ flexDirection: 'row', alignItems: 'center', gap: space.xs, flexShrink: 1 }}>
      {connection.kind === 'online' ? null : <Icon name="offline" size="s" tone="tight" />}
      <Text variant="smallFigures" tone={connection.kind === 'online' ? 'soft' : 'tight'} numberOfLines={1}>
        {words}
      </Text>
    </View>
  );
}

function statusWords(connection: Connection, waiting: number): string {
  const kept = waiting === 0 ? '' : `, ${waiting} ${waiting === 1 ? 'change waits' : 'changes wait'} here`;
  switch (connection.kind) {
    case 'connecting':
      return `connecting${kept}`;
    case 'online':
      return waiting === 0 ? 'saved' : 'saving';
    case 'offline':
      return `offline${kept}`;
    case 'outdated':
      return 'old page';
    case 'refused':
      return 'not taken in';
    default:
      return assertNever(connection);
  }
}
