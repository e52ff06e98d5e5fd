import { useMemo, useSyncExternalStore } from 'react';
import type { EditorSnapshot } from '@/components/editor/editor-snapshot';
import type { LayoutEditor } from '@/components/editor/layout-editor';

/** How often what stands beside the plan follows a finger, ms: often enough to read, seldom enough to leave frames alone. */
const CALM_MS = 150;

/**
 * A part of the editor's snapshot for what stands beside the plan. While something is carried it follows a few times
 * a second, so that the plan has the frames to itself; without a gesture it is as prompt as `useEditor`.
 */
export function useCalmEditor<T>(editor: LayoutEditor, select: (snapshot: EditorSnapshot) => T): T {
  const calm = useMemo(() => calmed(editor), [editor]);
  const read = () => select(calm.getSnapshot());
  return useSyncExternalStore(calm.subscribe, read, read);
}

function calmed(editor: LayoutEditor): Pick<LayoutEditor, 'getSnapshot' | 'subscribe'> {
  // only what is watched lags behind: nobody would be told of a change otherwise
  let shown: EditorSnapshot | null = null;
  return {
    getSnapshot: () => shown ?? editor.getSnapshot(),
    subscribe(listener) {
      let timer: ReturnType<typeof setTimeout> | null = null;
      const show = () => {
        timer = null;
        shown = editor.getSnapshot();
        listener();
      };
      shown = editor.getSnapshot();
      const stop = editor.subscribe(() => {
        if (editor.getSnapshot().gesture) {
          timer ??= setTimeout(show, CALM_MS);
          return;
        }
        if (timer !== null) clearTimeout(timer);
        show();
      });
      return () => {
        if (timer !== null) clearTimeout(timer);
        shown = null;
        stop();
      };
    },
  };
}
