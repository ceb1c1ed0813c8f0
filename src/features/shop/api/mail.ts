import { queryOptions } from '@tanstack/react-query';
import { MailList, MailView } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';

export const mailQuery = queryOptions({
  queryKey: ['mail'],
  queryFn: ({ signal }) => api.get('/mail', MailList, { signal }),
  refetchInterval: 15_000,
});

export const letterQuery = (mailId: number) =>
  queryOptions({
    queryKey: ['mail', mailId],
    queryFn: ({ signal }) => api.get(`/mail/${mailId}`, MailView, { signal }),
    staleTime: Infinity,
  });
