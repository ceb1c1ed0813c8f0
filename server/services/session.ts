import { findShop } from '#server/services/shop.ts';
import type { Actor } from '#server/middleware/route.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';
import { canOf } from '#shared/permissions.ts';
import { presentShop } from '#server/presenters/people.ts';
import type { SessionView } from '#shared/schemas/people.ts';

/** What every page asks first. Demo sign-ins are told in a trial that holds the demo shop, and nowhere else. */
export async function describeSession(actor: Actor | null, trial: boolean): Promise<SessionView> {
  const shop = await findShop();
  const demo = trial && shop?.demo === 1;
  return {
    needsSetUp: shop === null,
    trial,
    demoSignIns: demo
      ? DEMO_PEOPLE.map(({ role, name, email }) => ({ role, name, email, password: DEMO_PASSWORD }))
      : [],
    shop: shop ? presentShop(shop) : null,
    person: actor,
    can: actor ? canOf(actor.role) : {},
  };
}
