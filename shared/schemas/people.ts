import { z } from 'zod';
import { Can, Instant, PersonId, RoleName, Text } from '#shared/schemas/common.ts';

export const EmailAddress = z
  .email()
  .max(200)
  .transform((text) => text.toLowerCase());
/** Length over composition, after NIST SP 800-63B: at least 10, at most 128 characters. */
export const Password = z.string().min(10, 'at least 10 characters').max(128, 'at most 128 characters');

export const SetUpInput = z.strictObject({
  shopName: Text(80),
  units: z.enum(['imperial', 'metric']),
  currency: z.string().regex(/^[A-Z]{3}$/, 'three capital letters, ISO 4217'),
  paper: z.enum(['a4', 'letter']),
  name: Text(80),
  email: EmailAddress,
  password: Password,
});

export const InviteInput = z.strictObject({ name: Text(80), email: EmailAddress, role: RoleName });
export const PersonPatch = z.strictObject({
  name: Text(80).optional(),
  role: RoleName.optional(),
  active: z.boolean().optional(),
});
export const AcceptInvitationInput = z.strictObject({ password: Password });

export const Person = z.object({
  id: PersonId,
  name: z.string(),
  email: z.string(),
  role: RoleName,
  /** invited: the one-time link is not used yet. */
  state: z.enum(['active', 'invited', 'closed']),
  createdAt: Instant,
});

/** `link` is shown once to the manager and e-mailed; the server keeps only its hash. */
export const InvitedPerson = z.object({ person: Person, link: z.string(), mailed: z.boolean() });
export const PeopleList = z.object({ people: z.array(Person) });
export const InvitationView = z.object({
  name: z.string(),
  email: z.string(),
  role: RoleName,
  shopName: z.string(),
});

export const Shop = z.object({
  name: z.string(),
  units: z.enum(['imperial', 'metric']),
  /** Smallest inch fraction printed. */
  inchDenominator: z.union([z.literal(16), z.literal(32), z.literal(64)]),
  currency: z.string(),
  paper: z.enum(['a4', 'letter']),
  /** Above this mass sheets say to lift with help, in milligrams. */
  handlingMassMg: z.int(),
  /** What the scrap dealer pays, minor units per 1000 kg. */
  scrapMinorPerTonne: z.int(),
  version: z.int(),
});
export const ShopInput = z.strictObject({
  name: Text(80),
  units: z.enum(['imperial', 'metric']),
  inchDenominator: z.union([z.literal(16), z.literal(32), z.literal(64)]),
  currency: z.string().regex(/^[A-Z]{3}$/),
  paper: z.enum(['a4', 'letter']),
  handlingMassMg: z.int().min(1_000_000).max(1_000_000_000),
  scrapMinorPerTonne: z.int().min(0).max(1_000_000_000),
  version: z.int(),
});

/** First thing a page asks: who am I, which shop is this, what may I do. */
export const SessionView = z.object({
  needsSetUp: z.boolean(),
  /** No production switches: mail stays on this machine, demo sign-ins are offered when the demo shop is loaded. */
  trial: z.boolean(),
  demoSignIns: z.array(
    z.object({ role: RoleName, name: z.string(), email: z.string(), password: z.string() }),
  ),
  shop: Shop.nullable(),
  person: z.object({ id: PersonId, name: z.string(), email: z.string(), role: RoleName }).nullable(),
  can: Can,
});

export const MailSummary = z.object({ id: z.int(), to: z.string(), subject: z.string(), at: Instant });
export const MailView = MailSummary.extend({ from: z.string(), text: z.string() });
export const MailList = z.object({ mails: z.array(MailSummary) });

export const AuditList = z.object({
  entries: z.array(
    z.object({
      id: z.int(),
      at: Instant,
      who: z.string(),
      action: z.string(),
      subject: z.string(),
      detail: z.string(),
    }),
  ),
  nextBefore: z.int().nullable(),
});

export type Person = z.infer<typeof Person>;
export type Shop = z.infer<typeof Shop>;
export type ShopInput = z.infer<typeof ShopInput>;
export type SessionView = z.infer<typeof SessionView>;
export type SetUpInput = z.infer<typeof SetUpInput>;
export type InviteInput = z.infer<typeof InviteInput>;
export type PersonPatch = z.infer<typeof PersonPatch>;
export type InvitedPerson = z.infer<typeof InvitedPerson>;
export type InvitationView = z.infer<typeof InvitationView>;
export type MailSummary = z.infer<typeof MailSummary>;
export type MailView = z.infer<typeof MailView>;
