import { useMutation } from '@tanstack/react-query';
import { z } from 'zod';
import { api } from '#src/lib/api.ts';
import { paths } from '#src/lib/paths.ts';

/**
 * Ends the session and loads the page afresh, so that nothing of this person stays in the browser's memory and
 * whoever signs in next goes to their own place. `stay` keeps the address, for an invitation that waits there.
 */
export function useSignOut({ stay = false }: { stay?: boolean } = {}) {
  return useMutation({
    mutationFn: () => api.post('/auth/sign-out', {}, z.unknown()),
    onSuccess: () => window.location.assign(stay ? window.location.href : paths.signIn()),
  });
}
