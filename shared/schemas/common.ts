import { z } from 'zod';
import { LENGTH_UNITS } from '#shared/domain/units.ts';
import { FAMILIES } from '#shared/domain/section/types.ts';
import { ROLES } from '#shared/permissions.ts';

/** Row ids are whole numbers from 1; people's ids are opaque strings made by the sign-in library. */
export const Id = z.coerce.number().int().min(1);
export const PersonId = z.string().min(1).max(64);
export const Version = z.int().min(1);

/** Whole nanometres; up to a kilometre, longer is a slip of the pen. */
export const LengthNm = z.int().min(1).max(1_000_000_000_000);
export const AllowanceNm = z.int().min(0).max(100_000_000_000);
/** Whole minor units of the shop's currency. */
export const MoneyMinor = z.int().min(0).max(1_000_000_000_000);

export const Text = (max: number) => z.string().trim().min(1).max(max);
export const OptionalText = (max: number) => z.string().trim().max(max).default('');

/** ISO 8601 in UTC, as JSON carries it. */
export const Instant = z.iso.datetime();

export const UnitName = z.enum(LENGTH_UNITS);
export const FamilyName = z.enum(FAMILIES);
export const RoleName = z.enum(ROLES);

/** What this person may do with this one thing. */
export const Can = z.record(z.string(), z.boolean());
