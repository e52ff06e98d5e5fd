import { View } from 'react-native';
import { useEditor } from '@/components/canvas/use-editor';
import type { Notice as EditorNotice } from '@/components/editor/editor-snapshot';
import { layer, measure, space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import type { Plan } from './plan-state';

const KINDS = {
  refused: 'error',
  dropped: 'error',
  undo: 'info',
  information: 'info',
  storage: 'caution',
} as const;

/** What the member has to know, over the upper edge of the plan; each stays until it is put away. */
export function PlanNotices({ plan: { editor } }: { readonly plan: Plan }) {
  const notices = useEditor(editor, (snapshot) => snapshot.notices);
  const connection = useEditor(editor, (snapshot) => snapshot.connection);
  return (
    <View
      style={{
        position: 'absolute',
        top: space.m,
        left: space.m,
        right: space.m,
        zIndex: layer.bar,
        alignItems: 'center',
        pointerEvents: 'box-none',
      }}
    >
      <View style={{ width: '100%', maxWidth: measure.dialog, gap: space.s, pointerEvents: 'box-none' }}>
        {connection.kind === 'outdated' ? (
          <Notice
            kind="caution"
            text="This page is older than the server. Load it again; what waits here is kept."
          >
            <Button label="Load again" icon="refresh" onPress={() => globalThis.location.reload()} />
          </Notice>
        ) : null}
        {connection.kind === 'refused' ? (
          <Notice kind="error" text={connection.refusal.message}>
            <Button label="Try again" icon="refresh" onPress={() => editor.reconnect()} />
          </Notice>
        ) : null}
        {notices.slice(-2).map((notice) => (
          <PlanNotice
            key={notice.id}
            notice={notice}
            onDismiss={() => editor.dismissNotice(notice.id)}
            onRetry={() => void editor.retryNotice(notice.id)}
          />
        ))}
      </View>
    </View>
  );
}

type PlanNoticeProps = {
  readonly notice: EditorNotice;
  readonly onDismiss: () => void;
  readonly onRetry: () => void;
};

function PlanNotice({ notice, onDismiss, onRetry }: PlanNoticeProps) {
  return (
    <Notice kind={KINDS[notice.kind]} text={notice.message} onClose={onDismiss}>
      {notice.problems.map(({ path, message }) => (
        <Text key={`${path} ${message}`} variant="small" tone="soft">
          {`${path}: ${message}`}
        </Text>
      ))}
      {notice.changes ? <Button label="Try again" icon="refresh" onPress={onRetry} /> : null}
    </Notice>
  );
}
