import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/policies/actor.ts';
import { ShopRow, type Person } from '#server/models/index.ts';
import { passwordHash } from '#server/services/auth/passwords.ts';
import { record } from '#server/services/audit.ts';
import { makePerson } from '#server/services/people.ts';
import type { SetUpInput, ShopInput } from '#shared/schemas/people.ts';

/** NIOSH's load constant, 51 lb or 23 kg in ideal conditions, as the mark above which sheets say to lift with help. */
const HANDLING_MASS_MG = { imperial: 23_133_211, metric: 23_000_000 } as const;

export const findShop = (): Promise<ShopRow | null> => ShopRow.findByPk(1);

/** Makes shop and first manager, once. */
export async function setUpShop(input: SetUpInput, options: { demo?: boolean } = {}): Promise<Person> {
  const hash = await passwordHash(input.password);
  return write(async () => {
    if (await findShop()) throw new ShopError('wrong-state', 'The shop is set up already. Sign in.');
    await ShopRow.create({
      id: 1,
      name: input.shopName,
      units: input.units,
      inchDenominator: 16,
      currency: input.currency,
      paper: input.paper,
      handlingMassMg: HANDLING_MASS_MG[input.units],
      scrapMinorPerTonne: 0,
      demo: options.demo ? 1 : 0,
    });
    const manager = await makePerson({ name: input.name, email: input.email, role: 'manager', hash });
    await record({ id: manager.id, name: manager.name }, 'shop:set-up', `shop ${input.shopName}`, {});
    return manager;
  });
}

export async function changeShop(input: ShopInput, actor: Actor | null): Promise<ShopRow> {
  return write(async () => {
    const shop = await findShop();
    if (!shop) throw new ShopError('not-found', 'The shop is not set up yet.');
    if (shop.version !== input.version)
      throw new ShopError('stale-version', 'Somebody changed the settings meanwhile. Load them again.');
    const { version, ...settings } = input;
    await shop.update({ ...settings, version: version + 1 });
    await record(actor, 'shop:edit', `shop ${shop.name}`, settings);
    return shop;
  });
}
