import { z } from 'zod';
import { Can, Instant, LengthNm, OptionalText, Text, Version, FamilyName } from '#shared/schemas/common.ts';

export const DROP_STATES = ['racked', 'held', 'cut', 'scrapped', 'missing'] as const;
export const DropState = z.enum(DROP_STATES);

/** A place on the rack: bay–arm–level, e.g. B-3-2. Free text, because racks differ. */
export const Slot = Text(20);
/** null is "heat unknown": a value of its own, never filled by a guess. */
export const Heat = z.string().trim().min(1).max(40).nullable();

export const LogDropInput = z.strictObject({
  section: Text(60),
  grade: OptionalText(30),
  lengthNm: LengthNm,
  widthNm: LengthNm.nullable().default(null),
  slot: Slot,
  heat: Heat,
  note: OptionalText(200),
});
/** Changing a heat that is known needs a reason; an unknown one never becomes known by copying, only by a person typing it with a reason. */
export const DropPatch = z.strictObject({
  slot: Slot.optional(),
  heat: Heat.optional(),
  note: z.string().trim().max(200).optional(),
  state: z.enum(['racked', 'scrapped', 'missing']).optional(),
  reason: OptionalText(200),
  version: Version,
});

export const Drop = z.object({
  id: z.int(),
  /** Printed as D-0412; never reused. */
  tag: z.int(),
  section: z.string(),
  stockKey: z.string(),
  family: FamilyName,
  grade: z.string(),
  lengthNm: z.int(),
  widthNm: z.int().nullable(),
  massMg: z.int(),
  slot: z.string(),
  heat: z.string().nullable(),
  note: z.string(),
  state: DropState,
  heldByPlan: z.object({ id: z.int(), number: z.int(), name: z.string() }).nullable(),
  /** The bar it was cut from, as far as known. */
  from: z
    .object({ planId: z.int(), planNumber: z.int(), barId: z.int(), parentTag: z.int().nullable() })
    .nullable(),
  loggedBy: z.string(),
  loggedAt: Instant,
  version: z.int(),
  can: Can,
});
export const DropEvent = z.object({ at: Instant, who: z.string(), what: z.string(), why: z.string() });
export const DropList = z.object({ drops: z.array(Drop), can: Can });
export const DropView = z.object({
  drop: Drop,
  events: z.array(DropEvent),
  children: z.array(z.object({ id: z.int(), tag: z.int() })),
});

export type DropState = z.infer<typeof DropState>;
export type Drop = z.infer<typeof Drop>;
export type DropView = z.infer<typeof DropView>;
export type LogDropInput = z.infer<typeof LogDropInput>;
export type DropPatch = z.infer<typeof DropPatch>;
