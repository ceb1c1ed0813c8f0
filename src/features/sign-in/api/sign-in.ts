import { useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { api } from '#src/lib/api.ts';
import { sessionQuery } from '#src/lib/session.ts';

export type SignInInput = { email: string; password: string };

export const SignInForm = z.object({
  email: z
    .string()
    .trim()
    .min(1, 'Type your e-mail address.')
    .pipe(z.email('That is not an e-mail address.')),
  password: z.string().min(1, 'Type your password.'),
});

/** Opens a session and loads who we are now. */
export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (input: SignInInput) => {
      await api.post('/auth/sign-in/email', input, z.unknown());
      return client.fetchQuery({ ...sessionQuery, staleTime: 0 });
    },
  });
}
