import type { ShopRow } from '#server/models/index.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';
import { findShop } from '#server/services/shop.ts';
import type { SessionView } from '#shared/schemas/people.ts';

export type SessionFacts = {
  readonly shop: ShopRow | null;
  readonly trial: boolean;
  readonly demoSignIns: SessionView['demoSignIns'];
};

/** What every page asks first. Demo sign-ins are told in a trial that holds the demo shop, and nowhere else. */
export async function describeSession(trial: boolean): Promise<SessionFacts> {
  const shop = await findShop();
  const demo = trial && shop?.demo === 1;
  return {
    shop,
    trial,
    demoSignIns: demo
      ? DEMO_PEOPLE.map(({ role, name, email }) => ({ role, name, email, password: DEMO_PASSWORD }))
      : [],
  };
}
