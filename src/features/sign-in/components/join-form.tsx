import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Password, type InvitationView } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { placeIssues } from '#src/lib/form-issues.ts';
import { schemaResolver } from '#src/lib/schema-resolver.ts';
import { useAcceptInvitation } from '#src/features/sign-in/api/invitation.ts';

const JoinInput = z
  .object({ password: Password, again: z.string() })
  .refine(({ password, again }) => password === again, {
    path: ['again'],
    message: 'The two passwords differ. Type the second again.',
  });
type JoinInput = z.infer<typeof JoinInput>;

export function JoinForm({ token, invitation }: { token: string; invitation: InvitationView }) {
  const accept = useAcceptInvitation(token, invitation.email);
  const [rest, setRest] = useState<string | null>(null);
  const form = useForm<JoinInput>({
    resolver: schemaResolver(JoinInput),
    defaultValues: { password: '', again: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit(({ password }) => {
    setRest(null);
    accept.mutate(password, { onError: (error) => setRest(placeIssues(error, ['password'], form.setError)) });
  });
  return (
    <form noValidate className="grid gap-4" onSubmit={submit}>
      <TextField label="E-mail" type="email" autoComplete="username" value={invitation.email} readOnly />
      <TextField
        label="Choose a password"
        type="password"
        autoComplete="new-password"
        hint="At least 10 characters. Length counts more than odd signs."
        error={errors.password?.message}
        {...form.register('password')}
      />
      <TextField
        label="The same password again"
        type="password"
        autoComplete="new-password"
        error={errors.again?.message}
        {...form.register('again')}
      />
      {rest && (
        <Notice tone="fault" live>
          {rest}
        </Notice>
      )}
      <Button type="submit" variant="act" size="big" busy={accept.isPending} busyLabel="Joining">
        Join the shop
      </Button>
    </form>
  );
}
