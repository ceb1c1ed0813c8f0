import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { InvitedPerson } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Page } from '#src/components/page.tsx';
import { peopleQuery } from '#src/features/shop/api/people.ts';
import { InvitationLink } from '#src/features/shop/components/invitation-link.tsx';
import { InviteForm } from '#src/features/shop/components/invite-form.tsx';
import { PeopleList } from '#src/features/shop/components/people-list.tsx';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureQueryData(peopleQuery);

export function Component() {
  const { people } = useSuspenseQuery(peopleQuery).data;
  const [inviting, setInviting] = useState(false);
  const [invited, setInvited] = useState<InvitedPerson | null>(null);
  return (
    <Page
      title="People"
      sub="Who works with Barwright, and as what."
      actions={
        <Button variant="act" onClick={() => setInviting(true)}>
          Invite somebody
        </Button>
      }
    >
      <ShopTabs />
      {invited && <InvitationLink key={invited.link} invited={invited} onDone={() => setInvited(null)} />}
      <PeopleList people={people} onLink={setInvited} />
      <Dialog open={inviting} onOpenChange={setInviting} title="Invite somebody">
        <InviteForm
          onInvited={(answer) => {
            setInviting(false);
            setInvited(answer);
          }}
        />
      </Dialog>
    </Page>
  );
}
