import { queryOptions, useMutation } from '@tanstack/react-query';
import { z } from 'zod';
import { InvitationView } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';
import { useSignIn } from '#src/features/sign-in/api/sign-in.ts';

export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => api.get(`/invitations/${encodeURIComponent(token)}`, InvitationView, { signal }),
    retry: false,
    staleTime: Infinity,
  });

/** Sets the password of an invited person and signs them in; the link is used up by it. */
export function useAcceptInvitation(token: string, email: string) {
  const signIn = useSignIn();
  return useMutation({
    mutationFn: async (password: string) => {
      await api.post(`/invitations/${encodeURIComponent(token)}/accept`, { password }, z.unknown());
      return signIn.mutateAsync({ email, password });
    },
  });
}
