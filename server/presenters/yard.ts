import type { DropRuleRow, SupplierRow, StationRow } from '#server/models/index.ts';
import type { OfferWithSupplier } from '#server/services/offers.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import type { Family } from '#shared/domain/section/types.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import type { DropRule, Offer, Station, Supplier } from '#shared/schemas/yard.ts';

export function presentStation(station: StationRow, role: Role): Station {
  const { id, name, method, kerfNm, headCropNm, tailCropNm, holdDownNm, longestStopNm, note, version } =
    station;
  return {
    id,
    name,
    method,
    kerfNm,
    headCropNm,
    tailCropNm,
    holdDownNm,
    longestStopNm: longestStopNm ?? null,
    note,
    version,
    families: JSON.parse(station.families) as Family[],
    can: { 'station:edit': roleMay(role, 'station:edit') },
  };
}

export const presentDropRule = ({ family, keepFromNm, creditPercent, version }: DropRuleRow): DropRule => ({
  family,
  keepFromNm,
  creditPercent,
  version,
});

export const presentSupplier = ({ id, name, email, note, version }: SupplierRow, role: Role): Supplier => ({
  id,
  name,
  email,
  note,
  version,
  can: { 'supplier:edit': roleMay(role, 'supplier:edit') },
});

/** Milligrams per metre of a canonical bar name. */
export function mgPerMOf(stockKey: string): number {
  const section = sectionByName(stockKey);
  return section?.mass.per === 'length' ? section.mass.mgPerM : 0;
}

export const presentOffer = ({ offer, supplierName }: OfferWithSupplier, role: Role): Offer => ({
  id: offer.id,
  supplierId: offer.supplierId,
  supplierName,
  section: offer.section,
  stockKey: offer.stockKey,
  grade: offer.grade,
  lengthNm: offer.lengthNm,
  priceMinor: offer.priceMinor,
  massMg: barMassMg(mgPerMOf(offer.stockKey), offer.lengthNm),
  pricedAt: offer.pricedAt,
  version: offer.version,
  can: { 'offer:edit': roleMay(role, 'offer:edit') },
});
