import { useInfiniteQuery, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  jobDetailSchema,
  jobListSchema,
  jobSchema,
  layoutBriefSchema,
  platformBriefSchema,
  type jobChangeRequest,
  type jobRequest,
  type layoutChangeRequest,
  type layoutRequest,
  type platformChangeRequest,
  type platformRequest,
} from '@/shared/api/jobs';
import { frozenRevisionListSchema } from '@/shared/api/revisions';
import { listPath } from './list-path';
import { request } from './request';

const JOBS = ['jobs'] as const;
const jobKey = (jobId: string) => ['jobs', jobId] as const;

/** Jobs, newest change first, in pages. */
export function useJobs(search: string, archived: boolean) {
  return useInfiniteQuery({
    queryKey: [...JOBS, 'list', { search, archived }],
    queryFn: ({ pageParam, signal }) =>
      request(
        'GET',
        listPath('/api/jobs', { search, archived: archived ? 'true' : undefined, cursor: pageParam }),
        {
          schema: jobListSchema,
          signal,
        },
      ),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.next ?? undefined,
    placeholderData: (previous) => previous,
  });
}

export function useJob(jobId: string) {
  return useQuery({
    queryKey: jobKey(jobId),
    queryFn: ({ signal }) =>
      request('GET', `/api/jobs/${encodeURIComponent(jobId)}`, { schema: jobDetailSchema, signal }),
  });
}

export function useCreateJob() {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof jobRequest>) =>
      request('POST', '/api/jobs', { body, schema: jobSchema }),
    onSuccess: refresh,
  });
}

export function useChangeJob(jobId: string) {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof jobChangeRequest>) =>
      request('PATCH', `/api/jobs/${encodeURIComponent(jobId)}`, { body, schema: jobSchema }),
    onSuccess: refresh,
  });
}

export function useAddPlatform(jobId: string) {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof platformRequest>) =>
      request('POST', `/api/jobs/${encodeURIComponent(jobId)}/platforms`, {
        body,
        schema: platformBriefSchema,
      }),
    onSuccess: refresh,
  });
}

export function useRenamePlatform(platformId: string) {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof platformChangeRequest>) =>
      request('PATCH', `/api/platforms/${encodeURIComponent(platformId)}`, {
        body,
        schema: platformBriefSchema,
      }),
    onSuccess: refresh,
  });
}

export function useAddLayout(platformId: string) {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof layoutRequest>) =>
      request('POST', `/api/platforms/${encodeURIComponent(platformId)}/layouts`, {
        body,
        schema: layoutBriefSchema,
      }),
    onSuccess: refresh,
  });
}

export function useRenameLayout(layoutId: string) {
  const refresh = useRefreshJobs();
  return useMutation({
    mutationFn: (body: z.input<typeof layoutChangeRequest>) =>
      request('PATCH', `/api/layouts/${encodeURIComponent(layoutId)}`, { body }),
    onSuccess: refresh,
  });
}

/** Frozen revisions of the team, newest first: where an installer begins. */
export function useFrozenRevisions() {
  return useInfiniteQuery({
    queryKey: ['revisions', 'frozen'],
    queryFn: ({ pageParam, signal }) =>
      request('GET', listPath('/api/revisions', { cursor: pageParam }), {
        schema: frozenRevisionListSchema,
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.next ?? undefined,
  });
}

function useRefreshJobs() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: JOBS });
}
