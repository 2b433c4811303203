import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getProgress } from '../contracts/progress';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import type { changeSitting, getSitting, listCourses, listSittings, makeSitting } from '../contracts/sittings';
import type { getWaiting } from '../contracts/waiting';
import { api } from './api';
import { staleTimes } from './query-client';

type Sitting = ResponseOf<typeof getSitting>;

export const coursesQueryOptions = () =>
  queryOptions({
    queryKey: ['courses'],
    staleTime: staleTimes.steady,
    queryFn: ({ signal }) => api<ResponseOf<typeof listCourses>>('/courses', { signal }),
  });

export const courseSittingsQueryOptions = (courseId: string) =>
  queryOptions({
    queryKey: ['course-sittings', courseId],
    queryFn: ({ signal }) => api<ResponseOf<typeof listSittings>>(`/courses/${courseId}/sittings`, { signal }),
  });

export const sittingQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['sitting', sittingId],
    queryFn: ({ signal }) => api<Sitting>(`/sittings/${sittingId}`, { signal }),
  });

/** Counts by stage, looked at again while the page is open. */
export const progressQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['progress', sittingId],
    refetchInterval: staleTimes.steady / 4,
    queryFn: ({ signal }) => api<ResponseOf<typeof getProgress>>(`/sittings/${sittingId}/progress`, { signal }),
  });

export const waitingQueryOptions = () =>
  queryOptions({
    queryKey: ['waiting'],
    refetchInterval: staleTimes.steady / 2,
    queryFn: ({ signal }) => api<ResponseOf<typeof getWaiting>>('/waiting', { signal }),
  });

export const useWaiting = () => useQuery(waitingQueryOptions());
export const useCourses = () => useQuery(coursesQueryOptions());
export const useCourseSittings = (courseId: string) => useQuery(courseSittingsQueryOptions(courseId));
export const useSitting = (sittingId: string) => useQuery(sittingQueryOptions(sittingId));
export const useProgress = (sittingId: string) => useQuery(progressQueryOptions(sittingId));

export function useMakeSitting() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ courseId, body, once }: { courseId: string; body: SentBodyOf<typeof makeSitting>; once: string }) =>
      api<Sitting>(`/courses/${courseId}/sittings`, { method: 'POST', body, idempotencyKey: once }),
    onSuccess: (sitting) => {
      client.setQueryData(sittingQueryOptions(sitting.id).queryKey, sitting);
      return client.invalidateQueries({ queryKey: ['course-sittings'] });
    },
  });
}

export function useChangeSitting(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ rev, body }: { rev: number; body: SentBodyOf<typeof changeSitting> }) => api<Sitting>(`/sittings/${sittingId}`, { method: 'PATCH', rev, body }),
    onSuccess: (sitting) => {
      client.setQueryData(sittingQueryOptions(sittingId).queryKey, sitting);
      return client.invalidateQueries({ queryKey: ['course-sittings'] });
    },
  });
}
