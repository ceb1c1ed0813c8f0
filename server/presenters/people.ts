import type { z } from 'zod';
import type { AuditEntry, Mail, Person as PersonRow, ShopRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import type { SessionFacts } from '#server/services/session.ts';
import { canOf } from '#shared/permissions.ts';
import type { AuditList, MailSummary, MailView, Person, SessionView, Shop } from '#shared/schemas/people.ts';

export function presentPerson({ person, state }: { person: PersonRow; state: Person['state'] }): Person {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    state,
    createdAt: person.createdAt,
  };
}

export function presentShop(shop: ShopRow): Shop {
  const { name, units, inchDenominator, currency, paper, handlingMassMg, scrapMinorPerTonne, version } = shop;
  return {
    name,
    units,
    inchDenominator,
    currency,
    paper,
    handlingMassMg,
    scrapMinorPerTonne,
    version: version ?? 1,
  };
}

export function presentSession({ shop, trial, demoSignIns }: SessionFacts, actor: Actor | null): SessionView {
  return {
    needsSetUp: shop === null,
    trial,
    demoSignIns,
    shop: shop ? presentShop(shop) : null,
    person: actor,
    can: actor ? canOf(actor.role) : {},
  };
}

export function presentMail(mail: Mail): MailSummary {
  return { id: mail.id, to: mail.recipient, subject: mail.subject, at: mail.at };
}

export function presentMailText(mail: Mail): MailView {
  return { ...presentMail(mail), from: mail.sender, text: mail.text };
}

export function presentAudit(entry: AuditEntry): z.infer<typeof AuditList>['entries'][number] {
  return {
    id: entry.id,
    at: entry.at,
    who: entry.who,
    action: entry.action,
    subject: entry.subject,
    detail: entry.detail,
  };
}
