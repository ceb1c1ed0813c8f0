import {
  queryOptions,
  useMutation,
  useQueryClient,
  type Query,
  type QueryClient,
} from '@tanstack/react-query';
import { z } from 'zod';
import { PartLineList, PartListView, type PartListUpload } from '#shared/schemas/jobs.ts';
import { api } from '#src/lib/api.ts';

/** Who is signed in stays as it is. */
const ofTheShop = ({ queryKey }: Query) => queryKey[0] !== 'session';

/**
 * Jobs count pieces, plans count open lines: when a list comes or goes, what pages that are left remember is out of
 * date. They ask anew when they are opened again.
 */
function forgetLeftPages(client: QueryClient): void {
  client.removeQueries({ predicate: ofTheShop, type: 'inactive' });
}

export const partListQuery = (partListId: number) =>
  queryOptions({
    queryKey: ['part-lists', partListId],
    queryFn: ({ signal }) => api.get(`/part-lists/${partListId}`, PartListView, { signal }),
  });

/** Every line of a job with what is planned and cut of it. */
export const jobLinesQuery = (jobId: number) =>
  queryOptions({
    queryKey: ['part-lines', jobId],
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
    onSuccess: async (answer) => {
      forgetLeftPages(client);
      await client.invalidateQueries({ predicate: ofTheShop });
      client.setQueryData(partListQuery(answer.partList.id).queryKey, answer);
    },
  });
}

export function useDeletePartList() {
  const client = useQueryClient();
  const remove = useMutation({
    mutationFn: (partListId: number) => api.delete(`/part-lists/${partListId}`, undefined, z.unknown()),
    onSuccess: () => forgetLeftPages(client),
  });
  return {
    remove,
    /** Once its page is left too: while it still shows, the page would ask for the list again. */
    forget: () => forgetLeftPages(client),
  };
}
