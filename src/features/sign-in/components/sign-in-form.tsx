import { useForm } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { ApiError, faultWords } from '#src/lib/api-error.ts';
import { ROLE_DUTIES, ROLE_WORDS } from '#src/lib/role-words.ts';
import { schemaResolver } from '#src/lib/schema-resolver.ts';
import { useSession } from '#src/lib/session.ts';
import { SignInForm as Schema, useSignIn, type SignInInput } from '#src/features/sign-in/api/sign-in.ts';

/** A wrong address and a wrong password get the same words, so that nobody learns who works here. */
function wordsOf(error: unknown): string {
  if (error instanceof ApiError && error.status === 401)
    return 'E-mail address or password is wrong. Type them again, or ask a manager for a new link.';
  return faultWords(error).message;
}

export function SignInForm() {
  const { demoSignIns } = useSession();
  const signIn = useSignIn();
  const form = useForm<SignInInput>({
    resolver: schemaResolver(Schema),
    defaultValues: { email: '', password: '' },
  });
  const { errors } = form.formState;

  return (
    <>
      <form noValidate className="grid gap-4" onSubmit={form.handleSubmit((input) => signIn.mutate(input))}>
        <TextField
          label="E-mail"
          type="email"
          autoComplete="username"
          error={errors.email?.message}
          {...form.register('email')}
        />
        <TextField
          label="Password"
          type="password"
          autoComplete="current-password"
          error={errors.password?.message}
          {...form.register('password')}
        />
        {signIn.isError && (
          <Notice tone="fault" live>
            {wordsOf(signIn.error)}
          </Notice>
        )}
        <Button type="submit" variant="act" size="big" busy={signIn.isPending} busyLabel="Signing in">
          Sign in
        </Button>
      </form>

      {demoSignIns.length > 0 && (
        <section className="mt-9">
          <h2>Look around the demo shop</h2>
          <p className="mt-1 text-muted">
            This is a trial on this machine. One click signs you in as one of its people.
          </p>
          <ul className="mt-3 grid gap-2 p-0">
            {demoSignIns.map((demo) => (
              <li key={demo.email} className="list-none">
                <button
                  type="button"
                  disabled={signIn.isPending}
                  onClick={() => {
                    form.reset({ email: demo.email, password: demo.password });
                    signIn.mutate({ email: demo.email, password: demo.password });
                  }}
                  className="flex min-h-12 w-full flex-wrap items-baseline gap-x-3 border-[1.5px] border-ink bg-chalk px-3.5 py-2 text-left hover:bg-soap disabled:opacity-55"
                >
                  <span className="font-head text-[1.125rem] font-semibold">{ROLE_WORDS[demo.role]}</span>
                  <span>{demo.name}</span>
                  <span className="text-[0.9375rem] text-muted">{ROLE_DUTIES[demo.role]}</span>
                </button>
              </li>
            ))}
          </ul>
        </section>
      )}
    </>
  );
}
