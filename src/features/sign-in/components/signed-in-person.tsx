import { LogOut } from 'lucide-react';
import type { SessionView } from '#shared/schemas/people.ts';
import { ROLE_WORDS } from '#src/lib/role-words.ts';
import { useSignOut } from '#src/features/sign-in/api/sign-out.ts';

type SignedInPersonProps = { person: NonNullable<SessionView['person']>; narrow?: boolean };

/** Who is signed in, as what, and the way out. */
export function SignedInPerson({ person, narrow = false }: SignedInPersonProps) {
  const signOut = useSignOut();
  return (
    <div className={narrow ? 'flex items-center' : 'border-t border-white/20 pt-3 pr-1 pl-4.5'}>
      <p
        className={
          narrow
            ? 'text-[0.9375rem] text-layout-pale'
            : 'text-[0.8125rem] leading-snug break-words text-layout-pale'
        }
      >
        <span className={narrow ? 'sr-only' : 'font-medium text-chalk'}>{person.name}</span>
        {!narrow && <br />}
        {ROLE_WORDS[person.role]}
      </p>
      <button
        type="button"
        onClick={() => signOut.mutate()}
        disabled={signOut.isPending}
        className={
          narrow
            ? 'grid size-11 place-items-center text-chalk'
            : '-ml-1 flex min-h-11 items-center px-1 font-head font-medium text-layout-pale underline-offset-4 hover:text-white hover:underline'
        }
      >
        {narrow ? <LogOut aria-hidden size={19} /> : null}
        <span className={narrow ? 'sr-only' : ''}>Sign out</span>
      </button>
      {signOut.isError && (
        <p role="alert" className="text-[0.8125rem] text-chalk">
          Not signed out. Try again.
        </p>
      )}
    </div>
  );
}
