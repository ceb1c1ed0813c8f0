/** What suppliers ask for a bar of one section, grade and length. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import { OfferRow, SupplierRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { findSectionTyped, gradeTyped } from '#server/services/sections.ts';
import { listSuppliers } from '#server/services/yard.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import type { OfferInput } from '#shared/schemas/yard.ts';

export type OfferWithSupplier = { offer: OfferRow; supplierName: string };

/** By section and grade, then length, the cheapest first. */
export async function listOffers(): Promise<OfferWithSupplier[]> {
  const [offers, suppliers] = await Promise.all([
    OfferRow.findAll({
      where: { withdrawn: 0 },
      order: [
        ['stockKey', 'ASC'],
        ['grade', 'ASC'],
        ['lengthNm', 'ASC'],
        ['priceMinor', 'ASC'],
      ],
    }),
    listSuppliers(),
  ]);
  const names = new Map(suppliers.map(({ id, name }) => [id, name]));
  return offers.map((offer) => ({ offer, supplierName: names.get(offer.supplierId) ?? '' }));
}

async function readOffer(input: OfferInput, own: OfferRow | null) {
  const issues: ErrorIssue[] = [];
  const supplier = await SupplierRow.findByPk(input.supplierId);
  if (!supplier) issues.push({ path: 'supplierId', message: 'there is no such supplier' });
  const section = findSectionTyped(input.section);
  if (!section.ok) issues.push(section.issue);
  if (!supplier || !section.ok)
    throw new ShopError('bad-input', 'The offer cannot be kept like this; see each field.', issues);
  const { name, stockKey } = section.section;
  const bar = { stockKey, grade: gradeTyped(input.grade), lengthNm: input.lengthNm };
  const twin = await OfferRow.findOne({ where: { supplierId: supplier.id, ...bar, withdrawn: 0 } });
  if (twin && twin.id !== own?.id)
    throw new ShopError(
      'already-there',
      `${supplier.name} has a price for ${name}${bar.grade === '' ? '' : ` in ${bar.grade}`} of this length already. Change that one.`,
    );
  const details = {
    supplierId: supplier.id,
    section: name,
    ...bar,
    priceMinor: input.priceMinor,
    pricedAt: new Date().toISOString(),
  };
  return { supplierName: supplier.name, details };
}

const subjectOf = ({ section, grade }: OfferRow) => `offer ${section}${grade === '' ? '' : ` ${grade}`}`;

export function makeOffer(input: OfferInput, actor: Actor): Promise<OfferWithSupplier> {
  return write(async () => {
    const { supplierName, details } = await readOffer(input, null);
    const offer = await OfferRow.create(details);
    await record(actor, 'offer:make', subjectOf(offer), { supplierName, ...details });
    return { offer, supplierName };
  });
}

const findOffered = async (offerId: number) =>
  expectFound(await OfferRow.findOne({ where: { id: offerId, withdrawn: 0 } }), 'offer');

export function changeOffer(offerId: number, input: OfferInput, actor: Actor): Promise<OfferWithSupplier> {
  return write(async () => {
    const offer = await findOffered(offerId);
    expectVersion(offer, input.version, 'the offer');
    const { supplierName, details } = await readOffer(input, offer);
    await offer.update({ ...details, version: offer.version + 1 });
    await record(actor, 'offer:edit', subjectOf(offer), { supplierName, ...details });
    return { offer, supplierName };
  });
}

/** Plans were made with it, so the row stays; it is no longer offered. */
export function removeOffer(offerId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const offer = await findOffered(offerId);
    await offer.update({ withdrawn: 1, version: offer.version + 1 });
    await record(actor, 'offer:remove', subjectOf(offer), { lengthNm: offer.lengthNm });
  });
}
