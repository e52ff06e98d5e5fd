import { useEffect } from 'react';

/** Names the window after what is shown in it. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = title === 'Elbowroom' ? title : `${title} – Elbowroom`;
  }, [title]);
}
