import { useQuery } from '@tanstack/react-query';
import { layoutSchema } from '@/shared/api/layouts';
import { request } from './request';

/** Key of a layout as fetched once; what changes in it afterwards comes over the line. */
export function layoutKey(layoutId: string): readonly string[] {
  return ['layouts', layoutId];
}

/** A layout with its names, to show something before the line stands. */
export function useLayout(layoutId: string) {
  return useQuery({
    queryKey: layoutKey(layoutId),
    queryFn: ({ signal }) =>
      request('GET', `/api/layouts/${encodeURIComponent(layoutId)}`, { schema: layoutSchema, signal }),
    staleTime: 0,
    gcTime: 0,
  });
}
