import { z } from 'zod';
import { ShopError } from '#server/errors.ts';
import { fewTries } from '#server/middleware/few-tries.ts';
import { route, type Route } from '#server/middleware/route.ts';
import {
  presentAudit,
  presentMail,
  presentMailText,
  presentSession,
  presentShop,
} from '#server/presenters/people.ts';
import { listAudit } from '#server/services/audit.ts';
import { findMail, listMail } from '#server/services/mail.ts';
import { describeSession } from '#server/services/session.ts';
import { changeShop, findShop, setUpShop } from '#server/services/shop.ts';
import { Id } from '#shared/schemas/common.ts';
import {
  AuditList,
  MailList,
  MailView,
  SessionView,
  SetUpInput,
  Shop,
  ShopInput,
} from '#shared/schemas/people.ts';

const AUDIT_PAGE = 100;

export function shopRoutes({ trial }: { trial: boolean }): Route[] {
  return [
    route({ method: 'get', path: '/api/session', allow: 'anyone', answer: SessionView }, async ({ actor }) =>
      presentSession(await describeSession(trial), actor),
    ),
    route(
      {
        method: 'post',
        path: '/api/set-up',
        allow: 'anyone',
        before: [fewTries()],
        body: SetUpInput,
        status: 201,
      },
      async ({ body }) => {
        await setUpShop(body);
        return undefined;
      },
    ),
    route({ method: 'get', path: '/api/shop', allow: 'shop:read', answer: Shop }, async () => {
      const shop = await findShop();
      if (!shop) throw new ShopError('not-found', 'The shop is not set up yet.');
      return presentShop(shop);
    }),
    route(
      { method: 'put', path: '/api/shop', allow: 'shop:edit', body: ShopInput, answer: Shop },
      async ({ body, actor }) => presentShop(await changeShop(body, actor)),
    ),
    route({ method: 'get', path: '/api/mail', allow: 'mail:read', answer: MailList }, async () => {
      if (!trial) throw new ShopError('not-found', 'Mail is kept here in a local trial only.');
      return { mails: (await listMail()).map(presentMail) };
    }),
    route(
      {
        method: 'get',
        path: '/api/mail/:mailId',
        allow: 'mail:read',
        params: z.object({ mailId: Id }),
        answer: MailView,
      },
      async ({ params }) => {
        if (!trial) throw new ShopError('not-found', 'Mail is kept here in a local trial only.');
        return presentMailText(await findMail(params.mailId));
      },
    ),
    route(
      {
        method: 'get',
        path: '/api/audit',
        allow: 'audit:read',
        query: z.object({ before: Id.optional() }),
        answer: AuditList,
      },
      async ({ query }) => {
        const entries = await listAudit(query.before, AUDIT_PAGE);
        return {
          entries: entries.map(presentAudit),
          nextBefore: entries.length === AUDIT_PAGE ? (entries.at(-1)?.id ?? null) : null,
        };
      },
    ),
  ];
}
