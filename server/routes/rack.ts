import { z } from 'zod';
import { route, type Route } from '#server/middleware/route.ts';
import { presentDrop, presentDropView } from '#server/presenters/rack.ts';
import { changeDrop, logDrop } from '#server/services/change-drop.ts';
import { findDrop, listChildren, listDropEvents, listDrops } from '#server/services/drops.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import { Id } from '#shared/schemas/common.ts';
import { DropList, DropPatch, DropState, DropView, LogDropInput } from '#shared/schemas/rack.ts';

const ByDrop = z.object({ dropId: Id });

async function viewDrop(dropId: number, role: Role) {
  const [found, events, children] = await Promise.all([
    findDrop(dropId),
    listDropEvents(dropId),
    listChildren(dropId),
  ]);
  return presentDropView(found, events, children, role);
}

export const rackRoutes: Route[] = [
  route(
    {
      method: 'get',
      path: '/api/drops',
      allow: 'drop:read',
      query: z.object({
        state: z.union([DropState, z.literal('all')]).optional(),
        section: z.string().max(60).optional(),
        minLengthNm: z.coerce.number().int().min(0).optional(),
        text: z.string().max(60).optional(),
      }),
      answer: DropList,
    },
    async ({ query, actor }) => ({
      drops: (await listDrops(query)).map((drop) => presentDrop(drop, actor.role)),
      can: { 'drop:log': roleMay(actor.role, 'drop:log') },
    }),
  ),
  route(
    {
      method: 'post',
      path: '/api/drops',
      allow: 'drop:log',
      body: LogDropInput,
      answer: DropView,
      status: 201,
    },
    async ({ body, actor }) => viewDrop(await logDrop(body, actor), actor.role),
  ),
  route(
    { method: 'get', path: '/api/drops/:dropId', allow: 'drop:read', params: ByDrop, answer: DropView },
    ({ params, actor }) => viewDrop(params.dropId, actor.role),
  ),
  route(
    {
      method: 'patch',
      path: '/api/drops/:dropId',
      allow: 'drop:edit',
      params: ByDrop,
      body: DropPatch,
      answer: DropView,
    },
    async ({ params, body, actor }) => {
      await changeDrop(params.dropId, body, actor);
      return viewDrop(params.dropId, actor.role);
    },
  ),
];
