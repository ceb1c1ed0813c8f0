import type { Route } from '#server/middleware/route.ts';
import { jobRoutes } from '#server/routes/jobs.ts';
import { peopleRoutes } from '#server/routes/people.ts';
import { planRoutes } from '#server/routes/plans.ts';
import { rackRoutes } from '#server/routes/rack.ts';
import { shopRoutes } from '#server/routes/shop.ts';
import { signInRoutes } from '#server/routes/sign-in.ts';
import { yardRoutes } from '#server/routes/yard.ts';
import type { SignIn } from '#server/services/auth/sign-in.ts';
import type { Mailer } from '#server/services/mailer.ts';

export type RouteContext = {
  readonly trial: boolean;
  readonly publicUrl: string;
  readonly mailer: Mailer;
  readonly signIn: SignIn;
};

/** Every route of the API; the permission walk of the tests goes through this list. */
export function allRoutes(context: RouteContext): Route[] {
  return [
    ...signInRoutes(context.signIn),
    ...shopRoutes(context),
    ...peopleRoutes(context),
    ...yardRoutes,
    ...jobRoutes,
    ...planRoutes,
    ...rackRoutes,
  ];
}
