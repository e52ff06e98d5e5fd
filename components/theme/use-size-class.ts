import { breakpoint } from './tokens';
import { useMedia } from './use-media';

export type SizeClass = 'phone' | 'tablet' | 'desktop';

/** How much room the window gives. */
export function useSizeClass(): SizeClass {
  const tablet = useMedia(`(min-width: ${breakpoint.tablet}px)`);
  const desktop = useMedia(`(min-width: ${breakpoint.desktop}px)`);
  if (desktop) return 'desktop';
  return tablet ? 'tablet' : 'phone';
}
