import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiError } from '#src/lib/api-error.ts';

const TRIES = 2;

/** Only a lost connection or a faulty server is worth asking twice; a refusal stays a refusal. */
function worthRetrying(failures: number, error: unknown): boolean {
  if (!(error instanceof ApiError)) return false;
  return failures < TRIES && (error.status === 0 || error.status >= 500);
}

function makeQueryClient(): QueryClient {
  const client: QueryClient = new QueryClient({
    defaultOptions: {
      queries: { retry: worthRetrying, staleTime: 15_000, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
    queryCache: new QueryCache({ onError: onSignedOut }),
    mutationCache: new MutationCache({ onError: onSignedOut }),
  });
  /** A session that ended elsewhere: ask who we are again, the layout then leads to sign-in. */
  function onSignedOut(error: unknown): void {
    if (error instanceof ApiError && error.code === 'not-signed-in')
      void client.invalidateQueries({ queryKey: ['session'] });
  }
  return client;
}

export const queryClient = makeQueryClient();
