import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { createLiveTransport } from '@/components/api/live-socket';
import { createPendingStore } from '@/components/api/offline-pending-store';
import { followReview } from '@/components/api/review-events';
import { useSession } from '@/components/api/session-provider';
import { createLayoutEditor, type LayoutEditor } from '@/components/editor/layout-editor';
import type { Layout } from '@/shared/api/layouts';
import { createEstimator } from '@/shared/estimate/estimate';

/** The editor of a layout, with its line to the server; begun with the screen and ended with it. */
export function usePlanEditor(layout: Layout): LayoutEditor {
  const { member } = useSession();
  const client = useQueryClient();
  const [opened] = useState(() => {
    const transport = createLiveTransport();
    const editor = createLayoutEditor({
      layoutId: layout.id,
      me: { memberId: member.id, name: member.name },
      transport,
      estimator: createEstimator(),
      store: createPendingStore(member.id, layout.id),
      layout,
    });
    return { transport, editor };
  });
  useEffect(() => {
    const stopFollowing = followReview(client, opened.transport, layout.id);
    opened.editor.start();
    return () => {
      opened.editor.stop();
      stopFollowing();
    };
  }, [client, opened, layout.id]);
  return opened.editor;
}
