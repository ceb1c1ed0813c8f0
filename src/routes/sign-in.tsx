import { Navigate, useSearchParams } from 'react-router-dom';
import { Gate } from '#src/features/sign-in/components/gate.tsx';
import { SignInForm } from '#src/features/sign-in/components/sign-in-form.tsx';
import { LANDING, useSession } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

/** Only addresses of this site are gone back to. */
function safeBack(back: string | null): string | null {
  return back && /^\/(?![/\\])/.test(back) ? back : null;
}

export function Component() {
  const { needsSetUp, person, shop } = useSession();
  const [search] = useSearchParams();
  if (needsSetUp) return <Navigate to={paths.setUp()} replace />;
  if (person) return <Navigate to={safeBack(search.get('back')) ?? LANDING[person.role]} replace />;
  return (
    <Gate title="Sign in" sub={shop?.name}>
      <SignInForm />
    </Gate>
  );
}
