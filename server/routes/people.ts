import { z } from 'zod';
import { fewTries } from '#server/middleware/few-tries.ts';
import { route, type Route } from '#server/middleware/route.ts';
import { presentPerson } from '#server/presenters/people.ts';
import {
  acceptInvitation,
  changePerson,
  findInvitation,
  invitePerson,
  listPeople,
  renewLink,
} from '#server/services/people.ts';
import type { Mailer } from '#server/services/mailer.ts';
import { PersonId } from '#shared/schemas/common.ts';
import {
  AcceptInvitationInput,
  InvitationView,
  InvitedPerson,
  InviteInput,
  PeopleList,
  Person,
  PersonPatch,
} from '#shared/schemas/people.ts';

const ByPerson = z.object({ personId: PersonId });
const ByToken = z.object({ token: z.string().min(10).max(100) });

export function peopleRoutes(context: { mailer: Mailer; publicUrl: string }): Route[] {
  const invited = ({ person, state, link, mailed }: Awaited<ReturnType<typeof invitePerson>>) => ({
    person: presentPerson({ person, state }),
    link,
    mailed,
  });
  const limited = fewTries();
  return [
    route({ method: 'get', path: '/api/people', allow: 'person:read', answer: PeopleList }, async () => ({
      people: (await listPeople()).map(presentPerson),
    })),
    route(
      {
        method: 'post',
        path: '/api/people',
        allow: 'person:edit',
        body: InviteInput,
        answer: InvitedPerson,
        status: 201,
      },
      async ({ body, actor }) => invited(await invitePerson(body, actor, context)),
    ),
    route(
      {
        method: 'patch',
        path: '/api/people/:personId',
        allow: 'person:edit',
        params: ByPerson,
        body: PersonPatch,
        answer: Person,
      },
      async ({ params, body, actor }) => presentPerson(await changePerson(params.personId, body, actor)),
    ),
    route(
      {
        method: 'post',
        path: '/api/people/:personId/link',
        allow: 'person:edit',
        params: ByPerson,
        answer: InvitedPerson,
      },
      async ({ params, actor }) => invited(await renewLink(params.personId, actor, context)),
    ),
    route(
      {
        method: 'get',
        path: '/api/invitations/:token',
        allow: 'anyone',
        before: [limited],
        params: ByToken,
        answer: InvitationView,
      },
      async ({ params }) => {
        const { person, shopName } = await findInvitation(params.token);
        return { name: person.name, email: person.email, role: person.role, shopName };
      },
    ),
    route(
      {
        method: 'post',
        path: '/api/invitations/:token/accept',
        allow: 'anyone',
        before: [limited],
        params: ByToken,
        body: AcceptInvitationInput,
      },
      async ({ params, body }) => {
        await acceptInvitation(params.token, body.password);
        return undefined;
      },
    ),
  ];
}
