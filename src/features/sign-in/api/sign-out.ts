import { useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { api } from '#src/lib/api.ts';
import { sessionQuery } from '#src/lib/session.ts';

/** Ends the session and forgets everything this browser had loaded for it. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => api.post('/auth/sign-out', {}, z.unknown()),
    onSuccess: async () => {
      await client.fetchQuery({ ...sessionQuery, staleTime: 0 });
      client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    },
  });
}
