import { Controller } from 'react-hook-form';
import { InviteInput, type InvitedPerson } from '#shared/schemas/people.ts';
import { ROLES } from '#shared/permissions.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { ROLE_DUTIES, ROLE_WORDS } from '#src/lib/role-words.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useInvite } from '#src/features/shop/api/people.ts';

export function InviteForm({ onInvited }: { onInvited: (invited: InvitedPerson) => void }) {
  const invite = useInvite();
  const { form, onSubmit, fault, saving, errors } = useEditForm<
    InviteInput,
    InviteInput,
    null,
    InvitedPerson
  >({
    schema: InviteInput,
    thing: null,
    toForm: () => ({ name: '', email: '', role: 'operator' }),
    fields: ['name', 'email', 'role'],
    save: invite,
    onSaved: onInvited,
  });
  const role = form.watch('role');
  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <div>
        <Controller
          control={form.control}
          name="role"
          render={({ field }) => (
            <ChipField
              label="Role"
              value={field.value}
              onChange={field.onChange}
              choices={ROLES.map((value) => ({ value, label: ROLE_WORDS[value] }))}
            />
          )}
        />
        <p className="mt-1.5 text-muted">Does {ROLE_DUTIES[role]}.</p>
      </div>
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Inviting">
          Invite
        </Button>
      </div>
    </form>
  );
}
