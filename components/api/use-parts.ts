import { useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query';
import { partListSchema, partSchema, type PartContent } from '@/shared/api/parts';
import { listPath } from './list-path';
import { request } from './request';

const PARTS = ['parts'] as const;

export type PartFilter = {
  readonly kind: PartContent['kind'];
  readonly search?: string;
  readonly archived?: boolean;
};

/** Parts of the team's shelf, in pages. */
export function useParts({ kind, search = '', archived = false }: PartFilter) {
  return useInfiniteQuery({
    queryKey: [...PARTS, { kind, search, archived }],
    queryFn: ({ pageParam, signal }) =>
      request(
        'GET',
        listPath('/api/parts', { kind, search, archived: archived ? 'true' : undefined, cursor: pageParam }),
        { schema: partListSchema, signal },
      ),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.next ?? undefined,
    placeholderData: (previous) => previous,
  });
}

/** Puts a part on the shelf, or a new content into the one with this id. */
export function useSavePart() {
  const refresh = useRefreshParts();
  return useMutation({
    mutationFn: ({ id, content }: { readonly id: string | null; readonly content: PartContent }) =>
      id === null
        ? request('POST', '/api/parts', { body: { content }, schema: partSchema })
        : request('PUT', `/api/parts/${encodeURIComponent(id)}`, { body: { content }, schema: partSchema }),
    onSuccess: refresh,
  });
}

export function useCopyPart() {
  const refresh = useRefreshParts();
  return useMutation({
    mutationFn: (id: string) =>
      request('POST', `/api/parts/${encodeURIComponent(id)}/copy`, { schema: partSchema }),
    onSuccess: refresh,
  });
}

export function useArchivePart() {
  const refresh = useRefreshParts();
  return useMutation({
    mutationFn: ({ id, archived }: { readonly id: string; readonly archived: boolean }) =>
      request('PATCH', `/api/parts/${encodeURIComponent(id)}`, { body: { archived }, schema: partSchema }),
    onSuccess: refresh,
  });
}

function useRefreshParts() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: PARTS });
}
