import { useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  revisionDetailSchema,
  revisionListSchema,
  revisionSchema,
  type freezeRevisionRequest,
  type returnRevisionRequest,
  type Revision,
  type saveRevisionRequest,
} from '@/shared/api/revisions';
import { request } from './request';
import { upsertRevision } from './revisions-cache';

type RevisionList = z.output<typeof revisionListSchema>;

/** Key of the revisions of a layout in the cache. */
export function revisionsKey(layoutId: string): readonly string[] {
  return ['revisions', 'layout', layoutId];
}

/** Key of one whole revision in the cache. */
export function revisionKey(revisionId: string): readonly string[] {
  return ['revisions', 'one', revisionId];
}

/** The revisions of a layout, newest first. */
export function useRevisions(layoutId: string) {
  return useQuery({
    queryKey: revisionsKey(layoutId),
    queryFn: ({ signal }) =>
      request('GET', `/api/layouts/${encodeURIComponent(layoutId)}/revisions`, {
        schema: revisionListSchema,
        signal,
      }),
  });
}

/** One revision with its document and results. */
export function useRevision(revisionId: string) {
  return useQuery({
    queryKey: revisionKey(revisionId),
    queryFn: ({ signal }) =>
      request('GET', revisionPath(revisionId), { schema: revisionDetailSchema, signal }),
  });
}

/** Saves what the server holds of a layout as its next letter. */
export function useSaveRevision(layoutId: string) {
  const settle = useSettleRevision();
  return useMutation({
    mutationFn: (body: z.input<typeof saveRevisionRequest>) =>
      request('POST', `/api/layouts/${encodeURIComponent(layoutId)}/revisions`, {
        body,
        schema: revisionSchema,
      }),
    onSuccess: settle,
  });
}

export function useSubmitRevision() {
  const settle = useSettleRevision();
  return useMutation({
    mutationFn: (revisionId: string) =>
      request('POST', `${revisionPath(revisionId)}/submit`, { schema: revisionSchema }),
    onSuccess: settle,
  });
}

export function useReturnRevision(revisionId: string) {
  const settle = useSettleRevision();
  return useMutation({
    mutationFn: (body: z.input<typeof returnRevisionRequest>) =>
      request('POST', `${revisionPath(revisionId)}/return`, { body, schema: revisionSchema }),
    onSuccess: settle,
  });
}

export function useFreezeRevision(revisionId: string) {
  const settle = useSettleRevision();
  return useMutation({
    mutationFn: (body: z.input<typeof freezeRevisionRequest>) =>
      request('POST', `${revisionPath(revisionId)}/freeze`, { body, schema: revisionSchema }),
    onSuccess: settle,
  });
}

/** Puts a revision into the lists that show it, and has what depends on it fetched again. */
export function settleRevision(client: QueryClient, revision: Revision): void {
  client.setQueryData<RevisionList>(revisionsKey(revision.layoutId), (list) =>
    list ? { items: [...upsertRevision(list.items, revision)] } : list,
  );
  void client.invalidateQueries({ queryKey: ['revisions'] });
  void client.invalidateQueries({ queryKey: ['layouts'] });
  void client.invalidateQueries({ queryKey: ['jobs'] });
}

function useSettleRevision() {
  const client = useQueryClient();
  return (revision: Revision) => settleRevision(client, revision);
}

function revisionPath(revisionId: string): string {
  return `/api/revisions/${encodeURIComponent(revisionId)}`;
}
