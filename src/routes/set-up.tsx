import { Navigate } from 'react-router-dom';
import { Gate } from '#src/features/sign-in/components/gate.tsx';
import { SetUpForm } from '#src/features/sign-in/components/set-up-form.tsx';
import { LANDING, useSession } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

export function Component() {
  const { needsSetUp, person } = useSession();
  if (!needsSetUp) return <Navigate to={person ? LANDING[person.role] : paths.signIn()} replace />;
  return (
    <Gate title="Open your shop" sub="Two minutes, once. All of it can be changed later.">
      <SetUpForm />
    </Gate>
  );
}
