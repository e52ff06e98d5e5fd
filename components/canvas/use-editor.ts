import { useCallback, useSyncExternalStore } from 'react';
import type { EditorSnapshot } from '@/components/editor/editor-snapshot';
import type { LayoutEditor } from '@/components/editor/layout-editor';

/** A part of the editor's snapshot; `select` answers with something that keeps its identity while it is the same. */
export function useEditor<T>(editor: LayoutEditor, select: (snapshot: EditorSnapshot) => T): T {
  const subscribe = useCallback((listener: () => void) => editor.subscribe(listener), [editor]);
  const read = () => select(editor.getSnapshot());
  return useSyncExternalStore(subscribe, read, read);
}
