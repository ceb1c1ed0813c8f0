/** Stations, rules for drops worth keeping, suppliers and offers: what a plan draws its defaults from. */
import { z } from 'zod';
import {
  AllowanceNm,
  Can,
  FamilyName,
  Instant,
  LengthNm,
  MoneyMinor,
  OptionalText,
  Text,
  Version,
} from '#shared/schemas/common.ts';

export const StationInput = z
  .strictObject({
    name: Text(40),
    method: z.enum(['shear', 'saw', 'thermal']),
    /** A shear has none. */
    kerfNm: AllowanceNm,
    headCropNm: AllowanceNm,
    tailCropNm: AllowanceNm,
    holdDownNm: AllowanceNm,
    longestStopNm: LengthNm.nullable(),
    families: z.array(FamilyName).min(1),
    note: OptionalText(400),
    version: Version.optional(),
  })
  .refine((station) => station.method !== 'shear' || station.kerfNm === 0, {
    path: ['kerfNm'],
    message: 'a shear parts the bar without kerf: leave it at 0',
  });
export const Station = z.object({
  id: z.int(),
  name: z.string(),
  method: z.enum(['shear', 'saw', 'thermal']),
  kerfNm: z.int(),
  headCropNm: z.int(),
  tailCropNm: z.int(),
  holdDownNm: z.int(),
  longestStopNm: z.int().nullable(),
  families: z.array(FamilyName),
  note: z.string(),
  version: z.int(),
  can: Can,
});
export const StationList = z.object({ stations: z.array(Station) });

/** One rule a family; `creditPercent` of the cheapest offer's price a metre is what a kept drop is worth. */
export const DropRuleInput = z.strictObject({
  family: FamilyName,
  keepFromNm: LengthNm,
  creditPercent: z.int().min(0).max(100),
  version: Version,
});
export const DropRule = z.object({
  family: FamilyName,
  keepFromNm: z.int(),
  creditPercent: z.int(),
  version: z.int(),
});
export const DropRuleList = z.object({ rules: z.array(DropRule), can: Can });

export const SupplierInput = z.strictObject({
  name: Text(80),
  email: z.union([z.literal(''), z.email()]).default(''),
  note: OptionalText(400),
  version: Version.optional(),
});
export const Supplier = z.object({
  id: z.int(),
  name: z.string(),
  email: z.string(),
  note: z.string(),
  version: z.int(),
  can: Can,
});
export const SupplierList = z.object({ suppliers: z.array(Supplier) });

/** A supplier's price for one bar of a section, grade and length. `section` is checked and stored in canonical spelling. */
export const OfferInput = z.strictObject({
  supplierId: z.int().min(1),
  section: Text(60),
  grade: OptionalText(30),
  lengthNm: LengthNm,
  priceMinor: MoneyMinor,
  version: Version.optional(),
});
export const Offer = z.object({
  id: z.int(),
  supplierId: z.int(),
  supplierName: z.string(),
  section: z.string(),
  stockKey: z.string(),
  grade: z.string(),
  lengthNm: z.int(),
  priceMinor: z.int(),
  /** Milligrams of one bar. */
  massMg: z.int(),
  pricedAt: Instant,
  version: z.int(),
  can: Can,
});
export const OfferList = z.object({ offers: z.array(Offer) });

export type Station = z.infer<typeof Station>;
export type StationInput = z.infer<typeof StationInput>;
export type DropRule = z.infer<typeof DropRule>;
export type DropRuleInput = z.infer<typeof DropRuleInput>;
export type Supplier = z.infer<typeof Supplier>;
export type SupplierInput = z.infer<typeof SupplierInput>;
export type Offer = z.infer<typeof Offer>;
export type OfferInput = z.infer<typeof OfferInput>;
