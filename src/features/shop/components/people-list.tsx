import { useState } from 'react';
import type { InvitedPerson, Person } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { useFormats } from '#src/lib/formats.ts';
import { ROLE_WORDS } from '#src/lib/role-words.ts';
import { useRenewLink } from '#src/features/shop/api/people.ts';
import { PersonDialog } from '#src/features/shop/components/person-dialog.tsx';

const STATE_WORDS = { active: 'active', invited: 'invited, link not used yet', closed: 'closed' } as const;

type PeopleListProps = { people: readonly Person[]; onLink: (invited: InvitedPerson) => void };

export function PeopleList({ people, onLink }: PeopleListProps) {
  const { date } = useFormats();
  const [changing, setChanging] = useState<Person | null>(null);
  const renew = useRenewLink();
  const columns: Column<Person>[] = [
    {
      key: 'name',
      head: 'Name',
      rowHead: true,
      cell: (person) => <span className="font-semibold">{person.name}</span>,
    },
    {
      key: 'email',
      head: 'E-mail',
      fullLine: true,
      cell: (person) => <span className="max-sm:break-all">{person.email}</span>,
    },
    { key: 'role', head: 'Role', cell: (person) => ROLE_WORDS[person.role] },
    { key: 'state', head: 'State', cell: (person) => STATE_WORDS[person.state] },
    { key: 'since', head: 'Since', wideOnly: true, cell: (person) => date(person.createdAt) },
    {
      key: 'actions',
      fullLine: true,
      head: <span className="sr-only">Change</span>,
      align: 'right',
      cell: (person) => (
        <span className="flex gap-2 sm:justify-end">
          {person.state === 'invited' && (
            <Button
              size="small"
              variant="quiet"
              busy={renew.isPending && renew.variables === person.id}
              onClick={() => renew.mutate(person.id, { onSuccess: onLink })}
              aria-label={`New link for ${person.name}`}
            >
              New link
            </Button>
          )}
          <Button size="small" onClick={() => setChanging(person)} aria-label={`Change ${person.name}`}>
            Change
          </Button>
        </span>
      ),
    },
  ];
  return (
    <>
      {renew.isError && (
        <Notice tone="fault" live className="mb-4">
          {faultWords(renew.error).message}
        </Notice>
      )}
      <Table caption="People of the shop" columns={columns} rows={people} rowKey={(person) => person.id} />
      {changing && <PersonDialog key={changing.id} person={changing} onClose={() => setChanging(null)} />}
    </>
  );
}
