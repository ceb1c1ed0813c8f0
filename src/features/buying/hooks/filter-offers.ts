import type { Offer } from '#shared/schemas/yard.ts';

export type OfferFilter = { section: string; supplierId: number | null };

const squeeze = (text: string) => text.toLowerCase().replace(/\s/g, '').replace(/[×*]/g, 'x');

/** Offers whose section or grade contains the text, of one supplier or all; by section, then grade, length and price. */
export function filterOffers(offers: readonly Offer[], filter: OfferFilter): Offer[] {
  const wanted = squeeze(filter.section);
  return offers
    .filter(
      (offer) =>
        (filter.supplierId === null || offer.supplierId === filter.supplierId) &&
        (wanted === '' || squeeze(offer.section + offer.grade).includes(wanted)),
    )
    .sort(
      (a, b) =>
        a.section.localeCompare(b.section, 'en', { numeric: true }) ||
        a.grade.localeCompare(b.grade, 'en', { numeric: true }) ||
        a.lengthNm - b.lengthNm ||
        a.priceMinor - b.priceMinor,
    );
}
