import { useMutation } from '@tanstack/react-query';
import { z } from 'zod';
import type { SetUpInput } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';
import { useSignIn } from '#src/features/sign-in/api/sign-in.ts';

/** Makes the shop and its first manager, then signs that manager in. */
export function useSetUp() {
  const signIn = useSignIn();
  return useMutation({
    mutationFn: async (input: SetUpInput) => {
      await api.post('/set-up', input, z.unknown());
      return signIn.mutateAsync({ email: input.email, password: input.password });
    },
  });
}
