import { infiniteQueryOptions } from '@tanstack/react-query';
import { AuditList } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';
import { withSearch } from '#src/lib/paths.ts';

/** Newest first, a page at a time backwards. */
export const auditQuery = infiniteQueryOptions({
  queryKey: ['audit'],
  queryFn: ({ pageParam, signal }) =>
    api.get(withSearch('/audit', { before: pageParam }), AuditList, { signal }),
  initialPageParam: null as number | null,
  getNextPageParam: (page) => page.nextBefore,
});
