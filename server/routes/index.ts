import type { Route } from '#server/middleware/route.ts';
import { peopleRoutes } from '#server/routes/people.ts';
import { shopRoutes } from '#server/routes/shop.ts';
import type { Mailer } from '#server/services/mailer.ts';

export type RouteContext = { readonly trial: boolean; readonly publicUrl: string; readonly mailer: Mailer };

/** Every route of the API; the permission walk of the tests goes through this list. */
export function allRoutes(context: RouteContext): Route[] {
  return [...shopRoutes(context), ...peopleRoutes(context)];
}
