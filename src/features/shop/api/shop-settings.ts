import { useQueryClient } from '@tanstack/react-query';
import { Shop, type ShopInput } from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';
import { sessionQuery } from '#src/lib/session.ts';

/** The shop rides on the session, so a change of units or paper shows on every page at once. */
export function useShopSettings() {
  const client = useQueryClient();
  return {
    save: async (input: ShopInput) => {
      const shop = await api.put('/shop', input, Shop);
      client.setQueryData(sessionQuery.queryKey, (session) => session && { ...session, shop });
      return shop;
    },
    reload: async () => (await client.fetchQuery({ ...sessionQuery, staleTime: 0 })).shop,
  };
}
