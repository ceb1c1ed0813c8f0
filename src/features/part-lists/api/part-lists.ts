import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { PartLineList, PartListView, type PartListUpload } from '#shared/schemas/jobs.ts';
import { api } from '#src/lib/api.ts';

/** Jobs count pieces of their lists, so they are asked for again when a list comes or goes. */
const JOBS_KEY = ['jobs'] as const;
const LINES_KEY = ['part-lines'] as const;

export const partListQuery = (partListId: number) =>
  queryOptions({
    queryKey: ['part-lists', partListId],
    queryFn: ({ signal }) => api.get(`/part-lists/${partListId}`, PartListView, { signal }),
  });

/** Every line of a job with what is planned and cut of it. */
export const jobLinesQuery = (jobId: number) =>
  queryOptions({
    queryKey: [...LINES_KEY, jobId],
    queryFn: ({ signal }) => api.get(`/part-lines?jobIds=${jobId}`, PartLineList, { signal }),
  });

/** Where the bytes that were uploaded can be had again, unchanged. */
export function originalFilePath(partListId: number): string {
  return `/api/part-lists/${partListId}/file`;
}

type SavedList = { file: Blob; fileName: string; details: PartListUpload };

/** Sends the very bytes and the person's decisions; the shop reads them again with the same rules. */
export function useSavePartList(jobId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, fileName, details }: SavedList) => {
      const form = new FormData();
      form.append('details', JSON.stringify(details));
      form.append('file', file, fileName);
      return api.upload(`/jobs/${jobId}/part-lists`, form, PartListView);
    },
    onSuccess: (answer) => {
      client.setQueryData(partListQuery(answer.partList.id).queryKey, answer);
      return Promise.all([
        client.invalidateQueries({ queryKey: JOBS_KEY }),
        client.invalidateQueries({ queryKey: LINES_KEY }),
      ]);
    },
  });
}

export function useDeletePartList() {
  const client = useQueryClient();
  const remove = useMutation({
    mutationFn: (partListId: number) => api.delete(`/part-lists/${partListId}`, undefined, z.unknown()),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: JOBS_KEY }),
        client.invalidateQueries({ queryKey: LINES_KEY }),
      ]),
  });
  return {
    remove,
    /** Once its page is left: while it still shows, the page would ask for the list again. */
    forget: (partListId: number) => client.removeQueries({ queryKey: partListQuery(partListId).queryKey }),
  };
}
