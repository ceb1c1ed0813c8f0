import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { write } from '#server/database.ts';
import { invitationMail } from '#server/emails/invitation.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/policies/actor.ts';
import { Invitation, Person, ShopRow } from '#server/models/index.ts';
import {
  endSessions,
  passwordHash,
  personsWithPassword,
  setPassword,
} from '#server/services/auth/passwords.ts';
import { record } from '#server/services/audit.ts';
import type { Mailer } from '#server/services/mailer.ts';
import type { Role } from '#shared/permissions.ts';
import type { InviteInput, PersonPatch } from '#shared/schemas/people.ts';

const LINK_DAYS = 7;
const hashOf = (token: string) => createHash('sha256').update(token).digest('hex');

export type PersonWithState = { person: Person; state: 'active' | 'invited' | 'closed' };

/** Makes a person's row inside the running write. Without a password they can only come in by a link. */
export async function makePerson(details: {
  name: string;
  email: string;
  role: Role;
  hash?: string;
}): Promise<Person> {
  const now = new Date().toISOString();
  const person = await Person.create({
    id: randomUUID(),
    name: details.name,
    email: details.email,
    role: details.role,
    emailVerified: 1,
    createdAt: now,
    updatedAt: now,
  });
  if (details.hash !== undefined) await setPassword(person.id, details.hash);
  return person;
}

function stateOf(person: Person, withPassword: ReadonlySet<string>): PersonWithState['state'] {
  if (person.closed === 1) return 'closed';
  return withPassword.has(person.id) ? 'active' : 'invited';
}

export async function listPeople(): Promise<PersonWithState[]> {
  const [people, withPassword] = await Promise.all([
    Person.findAll({ order: [['name', 'ASC']] }),
    personsWithPassword(),
  ]);
  return people.map((person) => ({ person, state: stateOf(person, withPassword) }));
}

async function newLink(personId: string): Promise<string> {
  const token = randomBytes(24).toString('base64url');
  await Invitation.destroy({ where: { personId, usedAt: null } });
  await Invitation.create({
    personId,
    tokenHash: hashOf(token),
    expiresAt: new Date(Date.now() + LINK_DAYS * 86_400_000).toISOString(),
  });
  return token;
}

type LinkContext = { mailer: Mailer; publicUrl: string };

async function mailLink(person: Person, token: string, actor: Actor, { mailer, publicUrl }: LinkContext) {
  const link = `${publicUrl}/join/${token}`;
  const shop = await ShopRow.findByPk(1);
  const mailed = await mailer.send(
    invitationMail({
      to: person.email,
      name: person.name,
      shopName: shop?.name ?? 'the shop',
      inviter: actor.name,
      link,
      days: LINK_DAYS,
    }),
  );
  return { person, state: stateOf(person, await personsWithPassword()), link, mailed };
}

/** Adds a person and sends the one-time link; the manager sees it once too. */
export async function invitePerson(input: InviteInput, actor: Actor, context: LinkContext) {
  const { person, token } = await write(async () => {
    if (await Person.findOne({ where: { email: input.email } }))
      throw new ShopError('already-there', `${input.email} is already one of the shop's people.`);
    const made = await makePerson(input);
    await record(actor, 'person:invite', `person ${made.name}`, { email: made.email, role: made.role });
    return { person: made, token: await newLink(made.id) };
  });
  return mailLink(person, token, actor, context);
}

async function findPerson(personId: string): Promise<Person> {
  const person = await Person.findByPk(personId);
  if (!person) throw new ShopError('not-found', 'There is no such person.');
  return person;
}

/** A new link, which also serves a person who forgot the password; earlier links stop working. */
export async function renewLink(personId: string, actor: Actor, context: LinkContext) {
  const { person, token } = await write(async () => {
    const found = await findPerson(personId);
    if (found.closed === 1)
      throw new ShopError('wrong-state', `${found.name} is closed. Open the person again first.`);
    await record(actor, 'person:link', `person ${found.name}`, {});
    return { person: found, token: await newLink(found.id) };
  });
  return mailLink(person, token, actor, context);
}

/** Changes name, role or access. The shop always keeps one active manager. */
export async function changePerson(
  personId: string,
  patch: PersonPatch,
  actor: Actor,
): Promise<PersonWithState> {
  return write(async () => {
    const person = await findPerson(personId);
    const withPassword = await personsWithPassword();
    const losesManager =
      person.role === 'manager' &&
      ((patch.role !== undefined && patch.role !== 'manager') || patch.active === false);
    if (losesManager) {
      const others = await Person.findAll({ where: { role: 'manager', closed: 0 } });
      if (!others.some((other) => other.id !== person.id && withPassword.has(other.id)))
        throw new ShopError(
          'wrong-state',
          `${person.name} is the only manager. Make somebody else a manager first.`,
        );
    }
    const before = { name: person.name, role: person.role, closed: person.closed };
    await person.update({
      name: patch.name ?? person.name,
      role: patch.role ?? person.role,
      closed: patch.active === undefined ? person.closed : patch.active ? 0 : 1,
      updatedAt: new Date().toISOString(),
    });
    if (person.closed === 1) {
      await endSessions(person.id);
      await Invitation.destroy({ where: { personId: person.id, usedAt: null } });
    }
    await record(actor, 'person:edit', `person ${person.name}`, { before, after: patch });
    return { person, state: stateOf(person, withPassword) };
  });
}

/** The open invitation behind a token. Throws not-found with words for used, replaced and expired links alike. */
export async function findInvitation(
  token: string,
): Promise<{ invitation: Invitation; person: Person; shopName: string }> {
  const invitation = await Invitation.findOne({ where: { tokenHash: hashOf(token), usedAt: null } });
  const person = invitation ? await Person.findByPk(invitation.personId) : null;
  if (!invitation || !person || person.closed === 1 || invitation.expiresAt <= new Date().toISOString())
    throw new ShopError('not-found', 'This link has been used or has run out. Ask a manager for a new one.');
  const shop = await ShopRow.findByPk(1);
  return { invitation, person, shopName: shop?.name ?? '' };
}

/** Sets the password behind a one-time link; the link is used up. */
export async function acceptInvitation(token: string, password: string): Promise<Person> {
  const hash = await passwordHash(password);
  return write(async () => {
    const { invitation, person } = await findInvitation(token);
    await setPassword(person.id, hash);
    await endSessions(person.id);
    await invitation.update({ usedAt: new Date().toISOString() });
    await record({ id: person.id, name: person.name }, 'person:join', `person ${person.name}`, {});
    return person;
  });
}
