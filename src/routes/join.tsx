import { useQuery } from '@tanstack/react-query';
import { Navigate, useParams } from 'react-router-dom';
import { LinkButton } from '#src/components/button.tsx';
import { Busy } from '#src/components/busy.tsx';
import { Notice } from '#src/components/notice.tsx';
import { invitationQuery } from '#src/features/sign-in/api/invitation.ts';
import { Gate } from '#src/features/sign-in/components/gate.tsx';
import { JoinForm } from '#src/features/sign-in/components/join-form.tsx';
import { WrongPerson } from '#src/features/sign-in/components/wrong-person.tsx';
import { ApiError, faultWords } from '#src/lib/api-error.ts';
import { LANDING, useSession } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';
import { ROLE_DUTIES, ROLE_WORDS } from '#src/lib/role-words.ts';

export function Component() {
  const { token = '' } = useParams();
  const { person } = useSession();
  const { data: invitation, error } = useQuery(invitationQuery(token));
  if (person && person.email === invitation?.email) return <Navigate to={LANDING[person.role]} replace />;
  if (error) {
    const gone = error instanceof ApiError && error.code === 'not-found';
    return (
      <Gate title="This link does not open">
        <Notice
          tone="fault"
          title={gone ? 'The link is used up, too old or not complete' : faultWords(error).title}
        >
          {gone
            ? 'A link works once and for seven days. Ask a manager of the shop for a new one.'
            : faultWords(error).message}
        </Notice>
        <LinkButton to={paths.signIn()} className="mt-5">
          To sign-in
        </LinkButton>
      </Gate>
    );
  }
  if (!invitation)
    return (
      <Gate title="Join the shop">
        <Busy label="Reading the invitation" />
      </Gate>
    );
  return (
    <Gate
      title={`Join ${invitation.shopName}`}
      sub={`${invitation.name}, you are invited as ${ROLE_WORDS[invitation.role].toLowerCase()}: ${ROLE_DUTIES[invitation.role]}.`}
    >
      {person ? (
        <WrongPerson signedIn={person.name} invited={invitation.name} />
      ) : (
        <JoinForm token={token} invitation={invitation} />
      )}
    </Gate>
  );
}
