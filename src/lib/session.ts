import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { Action, Role } from '#shared/permissions.ts';
import { SessionView, type Shop } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';
import { paths } from '#src/lib/paths.ts';

/** Who am I, which shop is this, what may I do: every page asks it first. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => api.get('/session', SessionView, { signal }),
  staleTime: 60_000,
});

export function useSession(): SessionView {
  return useSuspenseQuery(sessionQuery).data;
}

/** The shop's settings. Pages behind sign-in always have one. */
export function useShop(): Shop {
  const { shop } = useSession();
  if (!shop) throw new Error('this page needs a shop that is set up');
  return shop;
}

/** Whether this person's role may do this at all; a single thing says more in its own `can`. */
export function useMay(action: Action): boolean {
  return useSession().can[action] ?? false;
}

/** Each role lands where its work is. */
export const LANDING: Readonly<Record<Role, string>> = {
  detailer: paths.jobs(),
  purchaser: paths.plans(),
  operator: paths.bench(),
  yard: paths.rack(),
  manager: paths.plans(),
};
