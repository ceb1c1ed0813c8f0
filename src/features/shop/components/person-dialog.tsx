import { useState } from 'react';
import type { Person } from '#shared/schemas/people.ts';
import { ROLES, type Role } from '#shared/permissions.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useToast } from '#src/components/toast.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { ROLE_DUTIES, ROLE_WORDS } from '#src/lib/role-words.ts';
import { useChangePerson } from '#src/features/shop/api/people.ts';

/** Name and role of one person, and whether they may sign in at all. */
export function PersonDialog({ person, onClose }: { person: Person; onClose: () => void }) {
  const say = useToast();
  const [name, setName] = useState(person.name);
  const [role, setRole] = useState<Role>(person.role);
  const change = useChangePerson(person.id);
  const closed = person.state === 'closed';
  const finish = (message: string) => () => {
    say(message);
    onClose();
  };
  return (
    <Dialog open onOpenChange={onClose} title={person.name} description={person.email}>
      <form
        noValidate
        className="grid gap-5"
        onSubmit={(event) => {
          event.preventDefault();
          change.mutate({ name, role }, { onSuccess: finish(`${name} is saved.`) });
        }}
      >
        <TextField
          label="Name"
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={name.trim() === '' ? 'Fill this in.' : undefined}
        />
        <div>
          <ChipField
            label="Role"
            value={role}
            onChange={setRole}
            choices={ROLES.map((value) => ({ value, label: ROLE_WORDS[value] }))}
          />
          <p className="mt-1.5 text-muted">Does {ROLE_DUTIES[role]}.</p>
        </div>
        {change.isError && (
          <Notice tone="fault" live>
            {faultWords(change.error).message}
          </Notice>
        )}
        <div className="flex flex-wrap justify-between gap-3">
          <Button
            type="submit"
            variant="act"
            busy={change.isPending}
            busyLabel="Saving"
            disabled={name.trim() === ''}
          >
            Save
          </Button>
          {closed ? (
            <Button
              disabled={change.isPending}
              onClick={() =>
                change.mutate({ active: true }, { onSuccess: finish(`${person.name} may sign in again.`) })
              }
            >
              Open the sign-in again
            </Button>
          ) : (
            <Button
              variant="danger"
              disabled={change.isPending}
              onClick={() =>
                change.mutate(
                  { active: false },
                  { onSuccess: finish(`${person.name} can no longer sign in.`) },
                )
              }
            >
              Close the sign-in
            </Button>
          )}
        </div>
      </form>
    </Dialog>
  );
}
