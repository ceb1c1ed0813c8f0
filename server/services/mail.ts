import { ShopError } from '#server/errors.ts';
import { Mail } from '#server/models/index.ts';

/** The newest first. */
export const listMail = (): Promise<Mail[]> => Mail.findAll({ order: [['id', 'DESC']], limit: 200 });

export async function findMail(mailId: number): Promise<Mail> {
  const mail = await Mail.findByPk(mailId);
  if (!mail) throw new ShopError('not-found', 'There is no such letter.');
  return mail;
}
