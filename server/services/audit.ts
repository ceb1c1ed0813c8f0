import { Op } from 'sequelize';
import { AuditEntry } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';

/** Writes who did what to which thing, inside the running transaction: no write without its entry. */
export async function record(
  actor: Pick<Actor, 'id' | 'name'> | null,
  action: string,
  subject: string,
  detail: object,
): Promise<void> {
  await AuditEntry.create({
    at: new Date().toISOString(),
    actorId: actor?.id ?? null,
    who: actor?.name ?? 'the system',
    action,
    subject,
    detail: JSON.stringify(detail),
  });
}

/** The trail, the newest first, from before an entry's id. */
export function listAudit(before: number | undefined, limit: number): Promise<AuditEntry[]> {
  return AuditEntry.findAll({
    ...(before === undefined ? {} : { where: { id: { [Op.lt]: before } } }),
    order: [['id', 'DESC']],
    limit,
  });
}
